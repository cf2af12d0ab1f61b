using StackTiming.Lines.Fields;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;
using Xunit;

namespace StackTiming.Lines.Tests.Fields;

public sealed class SolutionCacheTests : IDisposable
{
    private readonly string folder = Directory.CreateTempSubdirectory("stacktiming-cache-").FullName;
    private readonly Counting inner = new();

    public void Dispose() => Directory.Delete(folder, recursive: true);

    private SolutionCache Fresh() => new(inner, folder, "counting 1");

    private static CrossSection Section(double width) => new(
        [new DielectricSlab(new SectionDielectric("core", 4, 0.02), 0, 1e-4)], 0, null,
        [new SectionConductor("a", false, 0, width, width, 1.7e-5, 1e-4, true)], null, null, new SectionMetal(1.72e-8, 0));

    [Fact]
    public void A_section_is_solved_once_for_all_runs()
    {
        var first = Fresh().Calculate(Section(1e-4))!;
        var second = Fresh().Calculate(Section(1e-4))!;
        Assert.Equal(1, inner.Count);
        Assert.Equal(first.CapacitanceFaradPerMetre[0, 0], second.CapacitanceFaradPerMetre[0, 0]);
        Assert.Equal(first.InductanceHenryPerMetre[0, 0], second.InductanceHenryPerMetre[0, 0]);
        Assert.Equal(first.EnergyShares.ToArray(), second.EnergyShares.ToArray());
        Assert.Equal(first.Warnings.ToArray(), second.Warnings.ToArray());
        Assert.Equal((first.MethodId, first.RelativeError), (second.MethodId, second.RelativeError));
    }

    [Fact]
    public void Sections_that_differ_in_the_last_bit_are_different()
    {
        Fresh().Calculate(Section(1e-4));
        Fresh().Calculate(Section(Math.BitIncrement(1e-4)));
        Assert.Equal(2, inner.Count);
    }

    [Theory]
    [InlineData(0)]
    [InlineData(5)]
    [InlineData(60)]
    public void A_damaged_entry_is_solved_again_and_replaced(int keptBytes)
    {
        Fresh().Calculate(Section(1e-4));
        var file = Assert.Single(Directory.GetFiles(folder));
        var bytes = File.ReadAllBytes(file);
        File.WriteAllBytes(file, bytes[..Math.Min(keptBytes, bytes.Length - 1)]);
        Assert.NotNull(Fresh().Calculate(Section(1e-4)));
        Assert.Equal(2, inner.Count);
        Assert.NotNull(Fresh().Calculate(Section(1e-4)));
        Assert.Equal(2, inner.Count);
        Assert.Equal(bytes, File.ReadAllBytes(file));
    }

    [Fact]
    public void A_folder_that_cannot_be_made_costs_only_time()
    {
        var file = Path.Combine(folder, "file");
        File.WriteAllText(file, "");
        var cache = new SolutionCache(inner, Path.Combine(file, "below"), "counting 1");
        Assert.NotNull(cache.Calculate(Section(1e-4)));
    }

    [Fact]
    public void Many_at_once_leave_no_part_behind()
    {
        Parallel.For(0, 64, i => Assert.NotNull(Fresh().Calculate(Section(1e-4 + (i % 4 * 1e-5)))));
        Assert.Equal(4, Directory.GetFiles(folder).Length);
    }

    private sealed class Counting : ILineCalculator
    {
        private int count;

        public int Count => count;

        public string Name => "counting";

        public LineSolution? Calculate(CrossSection section)
        {
            Interlocked.Increment(ref count);
            return new LineSolution(["a"], "counting", new double[,] { { 1.25e-10 } }, new double[,] { { 3e-7 } }, [new DielectricShare("core", 0.7), new DielectricShare("air", 0.3)], 1e-4, ["a warning"]);
        }

        public string? Objection(CrossSection section) => null;
    }
}
