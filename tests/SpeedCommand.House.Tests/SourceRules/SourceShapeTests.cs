namespace SpeedCommand.House.Tests.SourceRules;

/// <summary>Small files, short methods, one public type a file.</summary>
public class SourceShapeTests
{
    private const int MaxFileLines = 300, MaxMemberLines = 60;

    [Fact]
    public void Files_AreShort() => Offences.None(
        from file in Repository.Sources("src", "tests")
        let length = Repository.Lines(file).Length
        where length > MaxFileLines
        select $"{file}: {length} lines");

    [Fact]
    public void Methods_AreShort() => Offences.None(
        from file in Repository.Sources("src", "tests")
        from member in SourceShape.MemberLengths(Repository.Lines(file))
        where member.Length > MaxMemberLines
        select $"{file}:{member.Line}: {member.Length} lines");

    [Fact]
    public void Files_HoldOnePublicType() => Offences.None(
        Repository.Sources("src").Where(file => SourceShape.PublicTypes(Repository.Lines(file)).Count() > 1));

    [Fact]
    public void Files_AreNamedAfterAType() => Offences.None(
        from file in Repository.Sources("src")
        let types = SourceShape.TopTypes(Repository.Lines(file)).ToList()
        where types.Count > 0 && !types.Exists(type => type.Split(' ', '(', '<', ';', ':').Contains(Path.GetFileNameWithoutExtension(file)))
        select file);

    [Fact]
    public void Shape_IsReadRight()
    {
        string[] lines =
        [
            "public sealed class Glide(int x)", "{", "    public void Land()", "    {", "        if (x > 0)", "        {", "        }", "    }",
            "", "    private sealed class Nested", "    {", "    }", "}", "", "public readonly record struct Wing;", "public enum Side", "{", "}",
        ];
        Assert.Equal([(3, 5)], SourceShape.MemberLengths(lines));
        Assert.Equal(3, SourceShape.TopTypes(lines).Count());
        Assert.Equal(["public sealed class Glide(int x)", "public readonly record struct Wing;"], SourceShape.PublicTypes(lines));
    }
}
