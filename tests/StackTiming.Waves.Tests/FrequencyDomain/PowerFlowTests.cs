using System.Numerics;
using StackTiming.Waves.FrequencyDomain;
using StackTiming.Waves.Networks;
using Xunit;

namespace StackTiming.Waves.Tests.FrequencyDomain;

/// <summary>A steady sinusoid on a matched line with loss, from the line's two-port.</summary>
public sealed class PowerFlowTests
{
    private const double Hertz = 1e9;
    private const int Pieces = 2000;
    private const double PieceMetres = 0.25 / Pieces;
    private static readonly LossyLineConstants Line = new(3.4e-7, 1.3e-10, 6, 1.5e-3, 0.02, Hertz);

    [Fact]
    public void Mean_power_flows_one_way_while_the_current_reverses_and_equals_loss_plus_load()
    {
        var two = new LossyLineAdmittance(new LossyLine(0, 1, PieceMetres, Line)).At(new Complex(0, 2 * Math.PI * Hertz));
        // The admittance that repeats itself through a piece is the characteristic one.
        var characteristic = Complex.Sqrt((two.Own * two.Own) - (two.Transfer * two.Transfer));
        var ratio = -two.Transfer / (two.Own + characteristic);
        var volts = Complex.One;
        double first = 0, last = 0, loss = 0;
        bool positive = false, negative = false;
        for (var i = 0; i <= Pieces; i++)
        {
            var amperes = characteristic * volts;
            var power = 0.5 * (volts * Complex.Conjugate(amperes)).Real;
            Assert.True(power > 0 && (i == 0 || power < last), "the mean power falls along the line and never turns back");
            first = i == 0 ? power : first;
            last = power;
            // At one instant the current flows forward in some places and backward in others.
            positive |= amperes.Real > 0;
            negative |= amperes.Real < 0;
            // Per metre: resistance r_dc + r_skin·√f in the conductor; at the stated frequency the dielectric's conductance is ω·c·df.
            var lossPerMetre = 0.5 * (((Line.DcResistanceOhmPerMetre + (Line.SkinResistance * Math.Sqrt(Hertz))) * Square(amperes))
                + (2 * Math.PI * Hertz * Line.CapacitanceFaradPerMetre * Line.Df * Square(volts)));
            loss += lossPerMetre * PieceMetres * (i is 0 or Pieces ? 0.5 : 1);
            volts *= ratio;
        }
        Assert.True(positive && negative);
        Assert.Equal(first, last + loss, 1e-6 * first);
        Assert.True(loss > 0.1 * first);
    }

    private static double Square(Complex value) => (value.Real * value.Real) + (value.Imaginary * value.Imaginary);
}
