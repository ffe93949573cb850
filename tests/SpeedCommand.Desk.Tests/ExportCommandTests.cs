using System.Text.Json;
using Parquet;
using SpeedCommand.Replay.Pictures;

namespace SpeedCommand.Desk.Tests;

[Collection("console")]
public sealed class ExportCommandTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("speedcommand-desk-").FullName;
    private readonly string _log;

    public ExportCommandTests()
    {
        _log = PathOf("short.log");
        Assert.Equal(0, DeskConsole.Run("simulate", "calm-glide", "--seed", "3", "--out", _log).Status);
    }

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    private string PathOf(string name) => Path.Combine(_folder, name);

    /// <summary>Every number of the Parquet file rounds to that of the JSON lines; every blank is null there and here.</summary>
    [Fact]
    public async Task Parquet_HoldsWhatTheJsonLinesHold()
    {
        var (parquet, lines) = (PathOf("flight.parquet"), PathOf("flight.jsonl"));
        Assert.Equal((0, ""), DeskConsole.Run("export", _log, "--to", parquet));
        Assert.Equal((0, ""), DeskConsole.Run("export", _log, "--to", lines));
        var expected = File.ReadAllLines(lines).Select(line => JsonDocument.Parse(line).RootElement).ToList();
        await using var reader = await ParquetReader.CreateAsync(parquet);
        Assert.Equal(PictureColumns.All.Select(column => column.Name), reader.Schema.DataFields.Select(field => field.Name));
        using var group = reader.OpenRowGroupReader(0);
        Assert.Equal((1, expected.Count), (reader.RowGroupCount, (int)group.RowCount));
        foreach (var column in PictureColumns.All)
        {
            var field = reader.Schema.DataFields.Single(field => field.Name == column.Name);
            if (column.Kind == PictureColumnKind.Number)
            {
                var numbers = new double?[expected.Count];
                await group.ReadAsync<double>(field, numbers.AsMemory());
                Assert.All(expected.Zip(numbers), pair => AssertNumber(pair.First.GetProperty(column.Name), pair.Second, column.Decimals));
            }
            else
            {
                var words = new string?[expected.Count];
                await group.ReadAsync(field, words.AsMemory()!);
                Assert.All(expected.Zip(words), pair => Assert.Equal(Plain(pair.First.GetProperty(column.Name)), pair.Second));
            }
        }
    }

    private static void AssertNumber(JsonElement expected, double? found, int decimals)
    {
        Assert.Equal(expected.ValueKind == JsonValueKind.Null, found is null);
        if (found is { } number)
        {
            Assert.Equal(expected.GetDouble(), number, 0.5000001 * Math.Pow(10, -decimals));
        }
    }

    private static string? Plain(JsonElement value) => value.ValueKind switch
    {
        JsonValueKind.Null => null,
        JsonValueKind.Array => string.Join(' ', value.EnumerateArray().Select(one => one.GetString())),
        _ => value.GetString(),
    };

    [Fact]
    public void Csv_HasARowAPicture()
    {
        var table = PathOf("flight.csv");
        Assert.Equal((0, ""), DeskConsole.Run("export", _log, "--to", table));
        var rows = File.ReadAllLines(table);
        Assert.StartsWith("t,phase,", rows[0], StringComparison.Ordinal);
        Assert.All(rows, row => Assert.Equal(PictureColumns.All.Count - 1, row.Count(character => character == ',')));
    }

    [Fact]
    public void Igc_NeedsPositions()
    {
        var igc = PathOf("flight.igc");
        var (status, errors) = DeskConsole.Run("export", _log, "--to", igc);
        Assert.Equal(65, status);
        Assert.Contains("expected positions (RMC or GGA sentences with a fix), found none", errors, StringComparison.Ordinal);
        Assert.False(File.Exists(igc));
    }

    [Theory]
    [InlineData(2, "--to: expected a file name ending in .parquet, .csv, .jsonl, .igc, found 'flight.xls'", "flight.xls")]
    [InlineData(74, "no/such/folder", "no/such/folder/flight.csv")]
    public void WrongUse_OneLineAndItsStatus(int expected, string message, string to)
    {
        var (status, errors) = DeskConsole.Run("export", _log, "--to", to);
        Assert.Equal(expected, status);
        Assert.Contains(message, Assert.Single(errors.TrimEnd().Split('\n')), StringComparison.Ordinal);
    }

    [Fact]
    public void MissingLog_IsToldOnce()
    {
        var (status, errors) = DeskConsole.Run("export", "nowhere.log", "--to", PathOf("x.csv"));
        Assert.Equal((66, "speedcommand-desk: LOG: expected a recorded flight, found no 'nowhere.log'\n"), (status, errors));
    }
}
