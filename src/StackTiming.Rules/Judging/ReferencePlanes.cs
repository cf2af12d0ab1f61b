using StackTiming.Stackups.Layers;

namespace StackTiming.Rules.Judging;

/// <summary>Finds the planes that a copper layer refers to.</summary>
public static class ReferencePlanes
{
    /// <summary>Whether the stack-up has a plane above and below a layer.</summary>
    /// <param name="stackUp">The stack-up.</param>
    /// <param name="layer">Name of a copper layer of it.</param>
    public static (bool Above, bool Below) Of(StackUp stackUp, string layer)
    {
        bool above = false, below = false, passed = false;
        foreach (var copper in stackUp.CopperLayers)
        {
            if (copper.Name == layer)
                passed = true;
            else if (copper.Use == CopperUse.Plane)
                (above, below) = passed ? (above, true) : (true, below);
        }
        return (above, below);
    }
}
