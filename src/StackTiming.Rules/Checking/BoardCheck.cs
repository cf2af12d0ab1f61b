using System.Collections.Immutable;
using StackTiming.Rules.Boards;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.Results;
using StackTiming.Rules.Waivers;
using StackTiming.Waves.Paths;

namespace StackTiming.Rules.Checking;

/// <summary>Checks a board: solves its lines, traces its paths, computes the waveforms that rules ask for, and judges the rules.</summary>
public static class BoardCheck
{
    /// <summary>Checks a board. The result does not depend on the number of threads.</summary>
    /// <param name="board">The board.</param>
    /// <param name="options">How.</param>
    /// <exception cref="OperationCanceledException">The check was stopped.</exception>
    public static CheckResult Run(Board board, CheckOptions options)
    {
        var clock = new PhaseClock(options);
        var keys = LineTable.KeysOf(board.Lengths);
        var lines = clock.Time(
            "lines", keys.Length, "sections",
            () => LineTable.Build(board.StackUp, keys, options.Calculator, board.Assumed.FrequencyHertz, options.Cancellation));
        var physics = new BoardPhysics(board, options.Calculator, lines);
        var needs = NeedsOf(board);
        TracePaths(physics, needs, clock);
        SolveWaves(physics, needs, clock);
        var judgements = Judge(board, physics, clock);
        var lineUses = CheckTables.Lines(board, lines, options.SecondOpinion);

        var findings = WaiverBook.Apply(
            [.. judgements.SelectMany(j => j.Findings)], board.Waivers, board.Rules.Select(r => r.Header.Id).ToHashSet(StringComparer.Ordinal), options.Today);
        var sorted = findings.ToArray();
        Array.Sort(sorted, WorstFirst.Instance);
        return new CheckResult
        {
            Board = board.Name,
            Revision = board.Revision,
            CheckedOn = options.Today,
            Counts = FindingCounts.Of(sorted),
            Inputs = board.Inputs,
            StackUp = board.StackUp,
            Rules = [.. board.Rules.Select(Summary)],
            Findings = ImmutableArray.Create(sorted),
            Groups = [.. judgements.SelectMany(j => j.Groups)],
            Waves = KeptWaves.Of(judgements.SelectMany(j => j.Waves), physics, options),
            Lines = lineUses,
            Methods = CheckTables.Methods(lineUses),
            Assumptions = CheckTables.Assumptions(board, physics.Notes, physics.WaveCount),
            Notes = board.Notes,
            Phases = [.. clock.Phases],
            NetCount = board.Lengths.Nets.Length,
            SegmentCount = board.Lengths.Segments.Length,
        };
    }

    private static List<NetNeed> NeedsOf(Board board)
    {
        var seen = new HashSet<NetNeed>();
        var needs = new List<NetNeed>();
        foreach (var rule in board.Rules)
        {
            foreach (var need in rule.Needs())
            {
                if (seen.Add(need))
                    needs.Add(need);
            }
        }
        return needs;
    }

    private static void TracePaths(BoardPhysics physics, List<NetNeed> needs, PhaseClock clock)
    {
        var paths = needs.Select(n => (n.Net, n.Drive)).Distinct().ToArray();
        clock.Run("delays", paths.Length, "nets", i => physics.Drives(paths[i].Net, paths[i].Drive, out _));
    }

    private static void SolveWaves(BoardPhysics physics, List<NetNeed> needs, PhaseClock clock)
    {
        var jobs = physics.WavesFor(needs);
        clock.Run("waves", jobs.Length, "nets", i => physics.Solve(jobs[i]));
    }

    private static Judgement[] Judge(Board board, BoardPhysics physics, PhaseClock clock)
    {
        var judgements = new Judgement[board.Rules.Length];
        clock.Run("rules", judgements.Length, "rules", i =>
        {
            judgements[i] = new Judgement(board.Rules[i].Header);
            board.Rules[i].Judge(physics, judgements[i]);
        });
        return judgements;
    }

    private static RuleSummary Summary(RuleFiles.Rule rule) => new(
        rule.Header.Id, rule.Header.Kind, rule.NetsText, rule.LimitText, rule.Header.Severity, rule.Header.Reason, rule.Header.Source, rule.Header.At);
}
