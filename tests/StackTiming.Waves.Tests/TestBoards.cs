using StackTiming.Nets.Lengths;
using StackTiming.Stackups.Copper;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Materials;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Waves.Tests;

/// <summary>A four-layer board whose figures are easy to follow by hand.</summary>
internal static class TestBoards
{
    /// <summary>L1 signal, 0.2 mm of Dk 4, L2 plane, 1 mm of Dk 3, L3 plane, 0.2 mm of Dk 4, L4 signal; copper 0.04 mm; no mask, no etching.</summary>
    public static StackUp FourLayers(double df = 0)
    {
        var copper = new CopperProperties(Quantity.Exact(1.72e-8), Quantity.Exact(0), Quantity.Exact(0));
        CopperLayer Layer(string name, CopperUse use, WideFace wide) => new(default, name, Quantity.Exact(40e-6), use, copper, wide, Tolerance.None);
        DielectricLayer Sheet(double millimetres, double dk) => new(
            default, DielectricKind.Core, new Dielectric("d" + dk, Quantity.Exact(dk), Quantity.Exact(df), 1e9, null), Quantity.Exact(1e-3 * millimetres));
        return new StackUp("four", "A",
        [
            Layer("L1", CopperUse.Signal, WideFace.Down), Sheet(0.2, 4), Layer("L2", CopperUse.Plane, WideFace.Down), Sheet(1, 3),
            Layer("L3", CopperUse.Plane, WideFace.Down), Sheet(0.2, 4), Layer("L4", CopperUse.Signal, WideFace.Up),
        ]);
    }

    public static LengthList Lengths(string rows)
    {
        var problems = new ProblemList();
        var text = "net,from,to,layer,length[mm],width[mm],gap[mm],drill[mm],pad[mm],antipad[mm],barrel,meander-gap[mm],meander-leg[mm]\n" + rows;
        var list = LengthListReader.Read(new InputFile("a.csv", text, ""), LengthListFormat.Own, null, problems);
        Assert.Empty(problems.Items);
        return list!;
    }
}
