using System.Collections.Immutable;

namespace StackTiming.Rules.Judging;

/// <summary>A receiver of a net with its responses to the edges that a rule judges.</summary>
/// <param name="Subject">What findings call it.</param>
/// <param name="Driven">The net from its driver.</param>
/// <param name="Path">The way to the receiver.</param>
/// <param name="Responses">Its responses, one for each edge.</param>
public sealed record JudgedResponse(
    string Subject, DrivenNet Driven, ReceiverPath Path, ImmutableArray<(Edge Edge, ReceiverResponse Response)> Responses)
{
    /// <summary>The responses that a rule judges; what has none becomes an unchecked finding.</summary>
    /// <param name="board">The board.</param>
    /// <param name="judgement">Where unchecked findings go.</param>
    /// <param name="nets">The nets.</param>
    /// <param name="query">Who drives, which receivers, which edges.</param>
    public static IEnumerable<JudgedResponse> Of(IBoardPhysics board, Judgement judgement, ImmutableArray<string> nets, EdgeQuery query)
    {
        foreach (var judged in JudgedNet.Of(board, nets, query.Drive))
        {
            if (judged.Drives.IsEmpty)
                judgement.Unchecked(judged.Net, [judged.Net], judged.Objection);
            foreach (var driven in judged.Drives)
            {
                var paths = driven.Receivers.Where(p => query.At.Includes(p.Receiver)).ToArray();
                if (paths.Length == 0)
                {
                    judgement.Unchecked(
                        judged.SubjectOf(driven), [judged.Net], driven.Receivers.IsEmpty ? "no receiver is on it" : $"it does not reach {query.At.Text}");
                }
                foreach (var path in paths)
                {
                    var subject = judged.SubjectOf(driven, path.Receiver);
                    if (Of(board, driven, path, query, out var reason) is { } responses)
                        yield return new JudgedResponse(subject, driven, path, responses);
                    else
                        judgement.Unchecked(subject, [judged.Net], reason);
                }
            }
        }
    }

    private static ImmutableArray<(Edge, ReceiverResponse)>? Of(
        IBoardPhysics board, DrivenNet driven, ReceiverPath path, EdgeQuery query, out string reason)
    {
        var responses = ImmutableArray.CreateBuilder<(Edge, ReceiverResponse)>(query.Edges.Length);
        reason = "";
        foreach (var edge in query.Edges)
        {
            if (board.Response(driven, path.Receiver, edge, out reason) is not { } response)
                return null;
            responses.Add((edge, response));
        }
        return responses.MoveToImmutable();
    }
}

/// <summary>Which responses a rule looks at.</summary>
/// <param name="Drive">Who drives.</param>
/// <param name="At">At which receivers.</param>
/// <param name="Edges">Which edges.</param>
public readonly record struct EdgeQuery(Drivers Drive, ReceiverChoice At, ImmutableArray<Edge> Edges);
