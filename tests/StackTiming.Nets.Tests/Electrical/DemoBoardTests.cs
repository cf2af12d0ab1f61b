using StackTiming.Nets.Electrical;
using StackTiming.Nets.Lengths;
using StackTiming.Nets.Parts;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Nets.Tests.Electrical;

public class DemoBoardTests
{
    private static string Repository()
    {
        var folder = AppContext.BaseDirectory;
        while (!File.Exists(Path.Combine(folder, "StackTiming.sln")))
            folder = Path.GetDirectoryName(folder)!;
        return folder;
    }

    [Theory]
    [InlineData("rev-b")]
    [InlineData("rev-c")]
    public void The_rows_of_the_demo_board_join_into_trees_that_somebody_drives(string revision)
    {
        var board = Path.Combine(Repository(), "stackups", "harbour-buoy");
        var problems = new ProblemList();
        var stackUp = StackUpReader.Read(InputFileLoader.Load(Path.Combine(board, "buoy.stackup.yaml"), default, problems)!, problems);
        var files = Directory.GetFiles(Path.Combine(board, revision), "*.lengths.csv").Order(StringComparer.Ordinal);
        var lengths = LengthListReader.Read([.. files.Select(f => (InputFileLoader.Load(f, default, problems)!, LengthListFormat.Own))], stackUp, problems);
        var map = YamlDocument.ReadMap(InputFileLoader.Load(Path.Combine(board, revision, "buoy.parts.yaml"), default, problems)!, problems)!;
        var reader = new MapReader(map, DefaultUnits.None, problems);
        FormatVersion.Check(reader);
        var parts = PartListReader.Read(reader);
        Assert.Empty(problems.Items);
        var nets = ElectricalNets.Build(lengths!, parts!, problems);
        Assert.False(problems.HasErrors);
        Assert.True(lengths!.Nets.Length >= 160);
        Assert.True(nets!.All.Length < lengths.Nets.Length, "series resistors join nets of the clock tree");
        // From the first driver every receiver is reached, and every segment lies on a path or on a stub of it.
        foreach (var net in nets.All)
        {
            if (!net.DriverNodes.Any() || net.ReceiverNodes.All(r => r == net.DriverNodes.First()))
                continue;
            var tree = new NetTree(net, net.DriverNodes.First());
            foreach (var receiver in net.ReceiverNodes.Where(r => r != tree.Root))
            {
                var path = tree.PathTo(receiver);
                Assert.True(path.TraceLengthMetres > 0);
                Assert.Equal(net.Branches.Length, path.Branches.Length + path.Stubs().Sum(s => s.Branches.Length));
            }
        }
    }
}
