using StackTiming.Waves.Networks;
using StackTiming.Waves.Responses;

namespace StackTiming.Waves.Characteristics;

/// <summary>
/// Transient response of a network of lossless lines by the method of characteristics: each line end is its impedance and a source that repeats, one
/// delay later, what the other end sent. L. Bergeron, "Du coup de bélier en hydraulique au coup de foudre en électricité", Dunod, Paris 1949; F. H. Branin,
/// "Transient analysis of lossless transmission lines", Proc. IEEE 55, 1967, pp. 2012–2013. Coupled lines are stepped mode by mode. Lumped elements follow
/// the trapezoidal rule. Works for trees and loops alike. Before t = 0 the net is in its direct-current state.
/// </summary>
public static class TransientSolver
{
    /// <summary>Name of the engine in results.</summary>
    public const string EngineName = "method of characteristics (Bergeron 1949, Branin 1967)";

    /// <summary>The response of a network without lossy lines.</summary>
    /// <param name="network">A network in which <see cref="NetworkCheck"/> finds no problem.</param>
    /// <param name="options">How finely to step; null for the default.</param>
    public static Response Solve(Network network, TransientOptions? options = null)
    {
        if (!network.LossyLines.IsEmpty)
            throw new ArgumentException("lossy lines need the frequency-domain engine", nameof(network));
        var step = StepChoice.Of(network, options ?? TransientOptions.Default);
        var run = new Run(network, Circuit.Of(network, step), step);
        return run.Solve();
    }

    private sealed class Run
    {
        private readonly Network network;
        private readonly Circuit circuit;
        private readonly double step;
        private readonly double[] initial, final, volts, before, currents, constant, lineSiemens;
        private readonly WaveHistory[] fromEnds, toEnds;
        private readonly CoupledEnds[] groups;
        private readonly BranchState[] branches;
        private readonly CapacitorState[] capacitors;
        private readonly InductorState[] inductors;
        private readonly NodeCluster[] clusters;
        private readonly int[] loneNodes;
        private readonly double[] loneOhms, arrivingFrom, arrivingTo;

        public Run(Network network, Circuit circuit, double step)
        {
            this.network = network;
            this.circuit = circuit;
            this.step = step;
            var steady = new SteadyState(circuit);
            var source = network.Source;
            initial = steady.Solve(source.InitialVolts);
            final = steady.Solve(source.FinalVolts);
            volts = (double[])initial.Clone();
            before = new double[circuit.NodeCount];
            currents = new double[circuit.NodeCount];
            constant = new double[circuit.NodeCount];
            lineSiemens = Array.ConvertAll(circuit.Lines, l => 1 / l.Z0Ohms);
            (fromEnds, toEnds) = Ends(steady, source.InitialVolts);
            groups = [.. circuit.Groups.Select((g, i) => new CoupledEnds(g, step, steady.GroupCurrents(i, source.InitialVolts), initial))];
            branches = [.. circuit.Branches.Select((b, i) => new BranchState(b, step, steady.BranchCurrent(i, source.InitialVolts), initial))];
            capacitors = [.. circuit.Shunts.Where(s => s.CapacitanceFarads > 0).Select(s => new CapacitorState(s.Node, s.CapacitanceFarads, step))];
            inductors =
            [
                .. circuit.Shunts.Select((s, i) => (Shunt: s, Current: steady.ShuntCurrent(i, source.InitialVolts)))
                    .Where(s => s.Shunt.InductanceHenries is not null)
                    .Select(s => new InductorState(s.Shunt.Node, s.Shunt.InductanceHenries!.Value, step, s.Current)),
            ];
            arrivingFrom = new double[circuit.Lines.Length];
            arrivingTo = new double[circuit.Lines.Length];
            var all = Clusters();
            // Most nodes stand alone between their lines: one product each, apart from the small matrices of the others.
            clusters = Array.FindAll(all, c => c.Nodes.Length > 1);
            var lone = Array.FindAll(all, c => c.Nodes.Length == 1);
            loneNodes = Array.ConvertAll(lone, c => c.Nodes[0]);
            loneOhms = Array.ConvertAll(lone, c => c.Inverse[0]);
            foreach (var shunt in circuit.Shunts)
            {
                if (shunt.ResistanceOhms is { } ohms)
                    constant[shunt.Node] += shunt.ToVolts / ohms;
            }
        }

        public Response Solve()
        {
            var count = (int)Math.Ceiling((network.DurationSeconds / step) - 1e-9) + 1;
            var source = new double[count];
            network.Source.Sample(0, step, source);
            var records = network.Receivers.Select(_ => new double[count]).ToArray();
            var pin = new double[count];
            Record(records, pin, 0);
            var quiet = new QuietWatch(network, circuit, step, final);
            var used = count;
            for (var n = 1; n < count; n++)
            {
                Advance(n, source[n]);
                Record(records, pin, n);
                if (!quiet.HasSettled(n, volts))
                    continue;
                used = n + 1;
                break;
            }
            NodeVoltage Voltage(double[] record, int node) => new(used == count ? record : record[..used], initial[node], final[node]);
            return new Response(
                step, network.DurationSeconds, [.. records.Select((r, i) => Voltage(r, network.Receivers[i].Node))],
                Voltage(pin, network.Driver.Node), EngineName);
        }

        private void Advance(int n, double sourceVolts)
        {
            constant.CopyTo(currents, 0);
            currents[circuit.SourceNode] += sourceVolts * circuit.SourceSiemens;
            var lines = circuit.Lines;
            for (var i = 0; i < lines.Length; i++)
            {
                // What arrives at one end is what the other end sent.
                ref readonly var line = ref lines[i];
                arrivingFrom[i] = toEnds[i].Arriving(n);
                arrivingTo[i] = fromEnds[i].Arriving(n);
                currents[line.From] += lineSiemens[i] * arrivingFrom[i];
                currents[line.To] += lineSiemens[i] * arrivingTo[i];
            }
            foreach (var group in groups)
                group.Prepare(n, currents);
            for (var i = 0; i < branches.Length; i++)
                branches[i].Prepare(volts, currents);
            for (var i = 0; i < capacitors.Length; i++)
                currents[capacitors[i].Node] += capacitors[i].Prepare(volts[capacitors[i].Node]);
            for (var i = 0; i < inductors.Length; i++)
                currents[inductors[i].Node] -= inductors[i].Prepare(volts[inductors[i].Node]);
            volts.CopyTo(before, 0);
            for (var i = 0; i < loneNodes.Length; i++)
                volts[loneNodes[i]] = loneOhms[i] * currents[loneNodes[i]];
            foreach (var cluster in clusters)
                cluster.Solve(currents, volts);
            for (var i = 0; i < lines.Length; i++)
            {
                ref readonly var line = ref lines[i];
                fromEnds[i].Send(n, (2 * volts[line.From]) - arrivingFrom[i]);
                toEnds[i].Send(n, (2 * volts[line.To]) - arrivingTo[i]);
            }
            foreach (var group in groups)
                group.Advance(n, volts);
            for (var i = 0; i < branches.Length; i++)
                branches[i].Advance(volts);
            for (var i = 0; i < capacitors.Length; i++)
                capacitors[i].Advance(before[capacitors[i].Node], volts[capacitors[i].Node]);
            for (var i = 0; i < inductors.Length; i++)
                inductors[i].Advance(before[inductors[i].Node], volts[inductors[i].Node]);
        }

        private void Record(double[][] records, double[] pin, int n)
        {
            for (var i = 0; i < records.Length; i++)
                records[i][n] = volts[network.Receivers[i].Node];
            pin[n] = volts[network.Driver.Node];
        }

        private (WaveHistory[] From, WaveHistory[] To) Ends(SteadyState steady, double sourceVolts)
        {
            var from = new WaveHistory[circuit.Lines.Length];
            var to = new WaveHistory[circuit.Lines.Length];
            for (var i = 0; i < from.Length; i++)
            {
                var line = circuit.Lines[i];
                var drop = line.Z0Ohms * steady.LineCurrent(i, sourceVolts);
                from[i] = new WaveHistory(line.DelaySeconds / step, initial[line.From] + drop);
                to[i] = new WaveHistory(line.DelaySeconds / step, initial[line.To] - drop);
            }
            return (from, to);
        }

        private NodeCluster[] Clusters()
        {
            var g = new double[circuit.NodeCount, circuit.NodeCount];
            var sets = new NodeSets(circuit.NodeCount);
            g[circuit.SourceNode, circuit.SourceNode] += circuit.SourceSiemens;
            for (var i = 0; i < circuit.Lines.Length; i++)
            {
                g[circuit.Lines[i].From, circuit.Lines[i].From] += lineSiemens[i];
                g[circuit.Lines[i].To, circuit.Lines[i].To] += lineSiemens[i];
            }
            foreach (var group in groups)
                group.AddTo(g, sets);
            foreach (var branch in branches)
            {
                g[branch.From, branch.From] += branch.Siemens;
                g[branch.To, branch.To] += branch.Siemens;
                g[branch.From, branch.To] -= branch.Siemens;
                g[branch.To, branch.From] -= branch.Siemens;
                sets.Join(branch.From, branch.To);
            }
            foreach (var capacitor in capacitors)
                g[capacitor.Node, capacitor.Node] += capacitor.Siemens;
            foreach (var inductor in inductors)
                g[inductor.Node, inductor.Node] += inductor.Siemens;
            foreach (var shunt in circuit.Shunts)
            {
                if (shunt.ResistanceOhms is { } ohms)
                    g[shunt.Node, shunt.Node] += 1 / ohms;
            }
            return NodeCluster.Of(g, [.. Enumerable.Range(0, circuit.NodeCount).Select(sets.Of)]);
        }
    }
}
