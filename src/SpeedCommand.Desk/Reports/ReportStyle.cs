namespace SpeedCommand.Desk.Reports;

/// <summary>The look of the pages: dark ink on white for daylight, nothing told by colour alone, sheets that break between figures.</summary>
internal static class ReportStyle
{
    public const string Css = """
        :root { --ink: #222b33; --quiet: #56616a; --line: #c9d0d6; --mark: #0072b2; }
        * { box-sizing: border-box; }
        body { margin: 0 auto; padding: 1.5rem; max-width: 66rem; background: #fff; color: var(--ink);
          font: 16px/1.5 "DejaVu Sans", Verdana, "Segoe UI", sans-serif; }
        header { border-bottom: 4px solid var(--mark); padding-bottom: .6rem; margin-bottom: 1.2rem; }
        h1 { font-size: 1.6rem; line-height: 1.2; margin: 0; }
        h2 { font-size: 1.15rem; margin: 1.8rem 0 .5rem; }
        p { margin: .4rem 0; }
        .quiet { color: var(--quiet); font-size: .9rem; }
        .caution { font-weight: bold; }
        dl { display: grid; grid-template-columns: repeat(auto-fit, minmax(9rem, 1fr)); gap: .6rem 1.2rem; margin: 1rem 0; }
        dt { color: var(--quiet); font-size: .85rem; }
        dd { margin: 0; font-size: 1.25rem; font-weight: bold; font-variant-numeric: tabular-nums; }
        figure { margin: 0 0 .4rem; break-inside: avoid; }
        figcaption { font-weight: bold; font-size: .95rem; }
        svg { display: block; width: 100%; height: auto; }
        .scroll { overflow-x: auto; }
        table { border-collapse: collapse; width: 100%; font-size: .9rem; font-variant-numeric: tabular-nums; break-inside: auto; }
        caption { text-align: left; color: var(--quiet); padding-bottom: .3rem; }
        th, td { padding: .3rem .7rem; border-bottom: 1px solid var(--line); text-align: right; vertical-align: top; }
        th { vertical-align: bottom; border-bottom: 2px solid var(--ink); }
        th:first-child, td:first-child, .words td, .words th { text-align: left; }
        tr { break-inside: avoid; }
        a { color: var(--mark); }
        @media print { body { padding: 0; max-width: none; font-size: 11px; } h2 { break-after: avoid; } @page { margin: 14mm; } }
        """;
}
