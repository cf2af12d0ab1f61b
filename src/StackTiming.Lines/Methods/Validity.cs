using System.Collections.Immutable;
using System.Globalization;

namespace StackTiming.Lines.Methods;

/// <summary>Collects where a section leaves the validity range of a method, so that a use outside it is never silent.</summary>
/// <param name="method">The method.</param>
public sealed class Validity(LineMethod method)
{
    private readonly ImmutableArray<string>.Builder warnings = ImmutableArray.CreateBuilder<string>();

    /// <summary>One sentence for each limit that is left; empty inside the range.</summary>
    public ImmutableArray<string> Warnings => warnings.ToImmutable();

    /// <summary>Checks a quantity against a range.</summary>
    /// <param name="what">Its name.</param>
    /// <param name="value">Its value.</param>
    /// <param name="least">Lowest valid value.</param>
    /// <param name="most">Highest valid value.</param>
    public Validity Within(string what, double value, double least, double most)
    {
        if (!(value >= least && value <= most))
            warnings.Add(string.Create(CultureInfo.InvariantCulture, $"{what} is {value:0.###}, outside the {least:0.###} to {most:0.###} of {method.Name}"));
        return this;
    }

    /// <summary>Checks a quantity against an upper limit.</summary>
    /// <param name="what">Its name.</param>
    /// <param name="value">Its value.</param>
    /// <param name="most">Highest valid value.</param>
    public Validity AtMost(string what, double value, double most)
    {
        if (!(value <= most))
            warnings.Add(string.Create(CultureInfo.InvariantCulture, $"{what} is {value:0.###}, above the {most:0.###} of {method.Name}"));
        return this;
    }
}
