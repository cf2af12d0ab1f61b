using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Reading;

namespace StackTiming.Lines.Tests.Sections;

/// <summary>Stack-ups for tests, written as users write them.</summary>
public static class ExampleStackUps
{
    /// <summary>Six layers: masked outer signals over planes, an inner signal pair L3 and L4 between the planes L2 and L5.</summary>
    public const string SixLayers = """
        format: 1
        name: six layers
        units: { length: um }
        dielectrics:
          core:    { dk: 4.0, df: 0.016, at: 1 GHz }
          prepreg: { dk: 3.7, df: 0.018, at: 1 GHz }
          mask:    { dk: 3.5, df: 0.025, at: 1 GHz }
        copper: { resistivity: 1.72e-8 ohm m, roughness: 1.0 um }
        layers:
          - { mask: mask, over-laminate: 25, over-copper: 15 }
          - { copper: L1, thickness: 45, use: signal, base: down, undercut: 15 }
          - { prepreg: prepreg, thickness: 75 }
          - { copper: L2, thickness: 15, use: plane }
          - { core: core, thickness: 100 }
          - { copper: L3, thickness: 15, use: signal, base: up, undercut: 6 }
          - { prepreg: prepreg, thickness: 400 }
          - { copper: L4, thickness: 15, use: signal, base: down, undercut: 6 }
          - { core: core, thickness: 100 }
          - { copper: L5, thickness: 15, use: plane }
          - { prepreg: prepreg, thickness: 75 }
          - { copper: L6, thickness: 45, use: signal, base: up, undercut: 15 }
          - { mask: mask, over-laminate: 25, over-copper: 15 }
        """;

    /// <summary>Reads a stack-up that must be without errors.</summary>
    public static StackUp Read(string yaml)
    {
        var problems = new ProblemList();
        var stackUp = StackUpReader.Read(new InputFile("test.stackup.yaml", yaml, ""), problems);
        Xunit.Assert.False(problems.HasErrors, string.Join('\n', problems.Items));
        return stackUp!;
    }
}
