using System.Text;
using SpeedCommand.Flight.LocatedJson;

namespace SpeedCommand.Flight.Tests.LocatedJson;

public sealed class JsonPlacesTests
{
    private const string Text = "{\n  // a comment\n  \"a\": 1.50,\n  \"b\": [ true,\n    null, \"x\\ty\" ],\r\n  \"c\": {\n    \"d\": { } }, /* another\n */ \"e\": [ [], ],\n}";

    [Theory] // path, line counted by hand in the text above, kind, text
    [InlineData("a", 3, JsonPlaceKind.Number, "1.50")]
    [InlineData("b", 4, JsonPlaceKind.Array, "")]
    [InlineData("b[0]", 4, JsonPlaceKind.Truth, "true")]
    [InlineData("b[1]", 5, JsonPlaceKind.Null, "null")]
    [InlineData("b[2]", 5, JsonPlaceKind.Text, "x\ty")]
    [InlineData("c", 6, JsonPlaceKind.Object, "")]
    [InlineData("c.d", 7, JsonPlaceKind.Object, "")]
    [InlineData("e", 8, JsonPlaceKind.Array, "")]
    [InlineData("e[0]", 8, JsonPlaceKind.Array, "")]
    public void TryParse_EveryValue_PathLineKindText(string path, int line, JsonPlaceKind kind, string text)
    {
        foreach (var lead in new[] { "", "\uFEFF" })
        {
            Assert.True(JsonPlaces.TryParse(Encoding.UTF8.GetBytes(lead + Text), "file", out var top, out _));
            var place = Assert.Single(All(top), place => place.Path == path);
            Assert.Equal((line, kind, text), (place.Line, place.Kind, place.Text));
        }
    }

    [Theory]
    [InlineData("", 1)]
    [InlineData("{\n\n  \"a\" 1 }", 3)]
    [InlineData("{\n  \"a\": 1,\n  \"a\": 2 }", 3)]
    [InlineData("{\n  \"a\": 1\n", 3)]
    [InlineData("{ }\n{ }", 2)]
    [InlineData("{\n \"a\": NaN }", 2)]
    [InlineData("[[[[[[[[[[[[[[[[[1]]]]]]]]]]]]]]]]]", 1)]
    public void TryParse_Unreadable_LineAndReason(string text, int line)
    {
        Assert.False(JsonPlaces.TryParse(Encoding.UTF8.GetBytes(text), "file.json", out _, out var problem));
        Assert.Equal(line, problem.Line);
        Assert.StartsWith($"file.json:{line}: ", problem.ToString(), StringComparison.Ordinal);
        Assert.DoesNotContain("LineNumber", problem.Message, StringComparison.Ordinal);
        Assert.False(problem.IsWarning);
    }

    [Fact]
    public void TryParse_InvalidUtf8InAText_Refused()
    {
        byte[] bytes = [.. "{\n \"a\": \""u8, 0xC3, 0x28, .. "\" }"u8];
        Assert.False(JsonPlaces.TryParse(bytes, "file", out _, out var problem));
        Assert.Equal(2, problem.Line);
    }

    [Fact]
    public void Find_OtherCapitals_Nothing()
    {
        Assert.True(JsonPlaces.TryParse("{ \"a\": 1 }"u8, "file", out var top, out _));
        Assert.NotNull(top.Find("a"));
        Assert.Null(top.Find("A"));
    }

    [Theory]
    [InlineData(3, "a.b", false, "f:3: a.b: wrong")]
    [InlineData(0, "", false, "f: wrong")]
    [InlineData(7, "", true, "f:7: warning: wrong")]
    public void ToString_Problem_OneLine(int line, string key, bool isWarning, string expected) =>
        Assert.Equal(expected, new JsonProblem("f", line, key, "wrong", isWarning).ToString());

    private static IEnumerable<JsonPlace> All(JsonPlace place) =>
        place.Members.Select(member => member.Value).Concat(place.Elements).SelectMany(All).Prepend(place);
}
