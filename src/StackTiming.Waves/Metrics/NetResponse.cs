using System.Collections.Immutable;
using StackTiming.Waves.Characteristics;
using StackTiming.Waves.FrequencyDomain;
using StackTiming.Waves.Networks;
using StackTiming.Waves.Responses;

namespace StackTiming.Waves.Metrics;

/// <summary>A network's waveforms with the metrics of every receiver.</summary>
/// <param name="Network">The network.</param>
/// <param name="Response">Its waveforms.</param>
/// <param name="Metrics">The metrics of each receiver, in the order of the network.</param>
public sealed record NetResponse(Network Network, Response Response, ImmutableArray<ReceiverMetrics> Metrics)
{
    /// <summary>Solves a network and judges its receivers.</summary>
    /// <param name="network">A network in which <see cref="NetworkCheck"/> finds no problem.</param>
    /// <param name="options">How finely to step; null for the default.</param>
    public static NetResponse Solve(Network network, TransientOptions? options = null)
    {
        // Loss spreads a wave over time in a way that no delayed copy of it has: such nets are linear here and solved in the frequency domain.
        var response = network.LossyLines.IsEmpty ? TransientSolver.Solve(network, options) : FrequencySolver.Solve(network);
        var reference = network.WithReferenceLoadAlone() is { } alone ? TransientSolver.Solve(alone, options) : null;
        var metrics = ImmutableArray.CreateBuilder<ReceiverMetrics>(network.Receivers.Length);
        for (var i = 0; i < network.Receivers.Length; i++)
        {
            var thresholds = network.Receivers[i].Thresholds;
            double? referenceMid = reference is not null && thresholds is { } levels
                ? WaveformMetrics.FirstCrossing(reference.Pin, reference.StepSeconds, levels.MidVolts, network.Stimulus.EndsHigh)
                : null;
            metrics.Add(WaveformMetrics.Of(response.Receivers[i], response.StepSeconds, network.DurationSeconds, thresholds, network.Stimulus, referenceMid));
        }
        return new NetResponse(network, response, metrics.MoveToImmutable());
    }
}
