using System.Text.Json;
using Xunit;

namespace StackTiming.Acceptance;

/// <summary>
/// <c>stacktiming section</c> against the independent finite-element and exact results of tests/references/sections, with the field solver: 0.1 % in every
/// impedance, effective permittivity and matrix entry above 1 % of the largest; energy shares within 0.002.
/// </summary>
public sealed class SectionReferenceTests
{
    private const double Limit = 1e-3;

    public static TheoryData<string, string> Cases()
    {
        var data = new TheoryData<string, string>();
        foreach (var name in ReferenceFiles.Names("sections/visible"))
            data.Add("sections/visible", name);
        // The letters are the exact families that a stack-up can express.
        foreach (var name in ReferenceFiles.Names("sections/exact", n => "abcghij".Contains(n[0]) && n[1] == '_'))
            data.Add("sections/exact", name);
        return data;
    }

    [Theory]
    [MemberData(nameof(Cases))]
    public void Section_command_agrees_with_the_reference(string folder, string name)
    {
        var reference = ReferenceFiles.Read(folder, name);
        using var files = new TemporaryFolder();
        var file = files.Write("case.section.yaml", SectionYaml.From(reference));
        var run = Tool.Run("section", file, "--method", "field", "--lossless", "--json");
        Assert.True(run.ExitCode == 0, run.Error);
        var actual = JsonDocument.Parse(run.Output).RootElement;
        var expected = reference.GetProperty("results");
        foreach (var key in new[] { "z0", "z_odd", "z_even", "z_diff", "z_common" })
            Compare(expected, key, actual, key + "_ohm");
        foreach (var key in new[] { "eps_eff", "eps_eff_odd", "eps_eff_even" })
            Compare(expected, key, actual, key);
        CompareMatrix(expected.GetProperty("C"), actual.GetProperty("c_matrix_f_per_m"));
        CompareMatrix(expected.GetProperty("L"), actual.GetProperty("l_matrix_h_per_m"));
        if (expected.TryGetProperty("energy_fraction", out var shares))
        {
            var found = actual.GetProperty("energy_fraction");
            foreach (var share in shares.EnumerateObject())
            {
                var value = found.TryGetProperty(share.Name, out var s) ? s.GetDouble() : 0;
                Assert.True(Math.Abs(value - share.Value.GetDouble()) <= 0.002, $"{share.Name}: {value} instead of {share.Value}");
            }
        }
    }

    private static void Compare(JsonElement expected, string key, JsonElement actual, string actualKey)
    {
        if (!expected.TryGetProperty(key, out var value))
            return;
        var error = Math.Abs((actual.GetProperty(actualKey).GetDouble() / value.GetDouble()) - 1);
        Assert.True(error <= Limit, $"{actualKey} is {actual.GetProperty(actualKey)} instead of {value}: {error:P3}");
    }

    private static void CompareMatrix(JsonElement expected, JsonElement actual)
    {
        // A single line may state its matrix as one number.
        if (expected.ValueKind == JsonValueKind.Number)
        {
            Assert.Equal(1, actual[0][0].GetDouble() / expected.GetDouble(), Limit);
            return;
        }
        var n = expected.GetArrayLength();
        var largest = Enumerable.Range(0, n).Max(i => expected[i].EnumerateArray().Max(v => Math.Abs(v.GetDouble())));
        for (var i = 0; i < n; i++)
        {
            for (var j = 0; j < n; j++)
            {
                var value = expected[i][j].GetDouble();
                if (Math.Abs(value) < 0.01 * largest)
                    continue;
                var error = Math.Abs((actual[i][j].GetDouble() / value) - 1);
                Assert.True(error <= Limit, $"entry {i},{j} is {actual[i][j]} instead of {value}: {error:P3}");
            }
        }
    }
}
