using Xunit;

namespace StackTiming.Lines.Tests;

public sealed class ReferenceSectionsTests
{
    [Fact]
    public void Lengths_are_in_metres_and_roles_are_kept()
    {
        var coplanar = ReferenceSections.Named("F10_coplanar_mask");

        Assert.Equal(0.36e-3, coplanar.Section.Slabs[0].TopMetres, 12);
        Assert.Equal(["g1", "g2"], coplanar.Section.Conductors.Where(c => c.Grounded).Select(c => c.Name));
        Assert.Equal(0.02e-3, coplanar.Section.TopMask!.OverCopperMetres, 12);
        Assert.Equal(0.0, coplanar.Section.BottomPlaneMetres);
        Assert.Null(coplanar.Section.TopPlaneMetres);
    }

    [Fact]
    public void All_sections_of_the_folders_but_the_round_ones_are_read()
    {
        string[] round = ["d_coax", "e_two_wire", "e_wire"];
        var names = Directory.GetFiles(ReferenceSections.Folder, "*.json", SearchOption.AllDirectories)
            .Select(f => Path.GetFileNameWithoutExtension(f))
            .Where(n => n != "analytic" && !round.Any(n.StartsWith));

        Assert.Equal(names.Order(), ReferenceSections.All.Select(r => r.Name).Order());
    }

    [Fact]
    public void Impedance_of_the_files_is_that_of_their_matrices()
    {
        foreach (var reference in ReferenceSections.All.Where(r => r.Impedances.ContainsKey("z0")))
        {
            var z0 = Math.Sqrt(reference.Inductance[0, 0] / reference.Capacitance[0, 0]);
            Assert.Equal(reference.Impedances["z0"], z0, reference.Impedances["z0"] * 1e-6);
        }
    }
}
