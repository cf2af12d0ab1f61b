using System.Collections.Concurrent;
using System.Collections.Immutable;
using System.Security.Cryptography;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.Fields;

/// <summary>
/// A calculator that remembers on disk what another one has solved, by the digest of the section. Entries carry a digest of their own: one that is damaged is solved
/// again and replaced. Entries appear whole or not at all, so that many processes may share the folder. A folder that cannot be written costs nothing but time.
/// </summary>
/// <param name="inner">Solves what is not remembered.</param>
/// <param name="folder">The folder.</param>
/// <param name="solver">What solves, with its version and tolerance; part of every digest.</param>
public sealed class SolutionCache(ILineCalculator inner, string folder, string solver) : ILineCalculator
{
    private const int MostSignals = 1000;
    private readonly ConcurrentDictionary<string, Lazy<LineSolution?>> solved = new(StringComparer.Ordinal);

    /// <inheritdoc/>
    public string Name => inner.Name;

    /// <inheritdoc/>
    public LineSolution? Calculate(CrossSection section)
    {
        var digest = SectionDigest.Of(section, solver);
        return solved.GetOrAdd(digest, d => new Lazy<LineSolution?>(() => Read(d) ?? Solve(d, section))).Value;
    }

    /// <inheritdoc/>
    public string? Objection(CrossSection section) => Calculate(section) is null ? inner.Objection(section) : null;

    private LineSolution? Solve(string digest, CrossSection section)
    {
        if (inner.Calculate(section) is not { } solution)
            return null;
        try
        {
            Directory.CreateDirectory(folder);
            var temporary = Path.Combine(folder, $"{digest}.{Convert.ToHexStringLower(RandomNumberGenerator.GetBytes(6))}.part");
            File.WriteAllBytes(temporary, Bytes(solution));
            File.Move(temporary, PathOf(digest), overwrite: true);
        }
        catch (Exception failure) when (failure is IOException or UnauthorizedAccessException or NotSupportedException)
        {
            // The result stands; it will be solved again next time.
        }
        return solution;
    }

    private LineSolution? Read(string digest)
    {
        try
        {
            return File.Exists(PathOf(digest)) ? Parse(File.ReadAllBytes(PathOf(digest))) : null;
        }
        catch (Exception failure) when (failure is IOException or UnauthorizedAccessException)
        {
            return null;
        }
    }

    private string PathOf(string digest) => Path.Combine(folder, digest + ".line");

    private static byte[] Bytes(LineSolution solution)
    {
        using var stream = new MemoryStream();
        using (var writer = new BinaryWriter(stream))
        {
            writer.Write(solution.Signals.Length);
            foreach (var signal in solution.Signals)
                writer.Write(signal);
            writer.Write(solution.MethodId);
            foreach (var value in solution.CapacitanceFaradPerMetre)
                writer.Write(value);
            foreach (var value in solution.InductanceHenryPerMetre)
                writer.Write(value);
            writer.Write(solution.EnergyShares.Length);
            foreach (var share in solution.EnergyShares)
            {
                writer.Write(share.Dielectric);
                writer.Write(share.Share);
            }
            writer.Write(solution.RelativeError);
            writer.Write(solution.Warnings.Length);
            foreach (var warning in solution.Warnings)
                writer.Write(warning);
        }
        var body = stream.ToArray();
        return [.. SHA256.HashData(body), .. body];
    }

    private static LineSolution? Parse(byte[] bytes)
    {
        if (bytes.Length < SHA256.HashSizeInBytes || !SHA256.HashData(bytes.AsSpan(SHA256.HashSizeInBytes)).AsSpan().SequenceEqual(bytes.AsSpan(0, SHA256.HashSizeInBytes)))
            return null;
        using var reader = new BinaryReader(new MemoryStream(bytes, SHA256.HashSizeInBytes, bytes.Length - SHA256.HashSizeInBytes));
        var n = reader.ReadInt32();
        if (n is < 1 or > MostSignals)
            return null;
        var signals = Strings(reader, n);
        var method = reader.ReadString();
        var c = Matrix(reader, n);
        var l = Matrix(reader, n);
        var shares = ImmutableArray.CreateBuilder<DielectricShare>();
        for (var i = reader.ReadInt32(); i > 0; i--)
            shares.Add(new DielectricShare(reader.ReadString(), reader.ReadDouble()));
        return new LineSolution(signals, method, c, l, shares.ToImmutable(), reader.ReadDouble(), Strings(reader, reader.ReadInt32()));
    }

    private static ImmutableArray<string> Strings(BinaryReader reader, int count)
    {
        var strings = ImmutableArray.CreateBuilder<string>();
        for (var i = 0; i < count; i++)
            strings.Add(reader.ReadString());
        return strings.ToImmutable();
    }

    private static double[,] Matrix(BinaryReader reader, int n)
    {
        var matrix = new double[n, n];
        for (var i = 0; i < n; i++)
        {
            for (var j = 0; j < n; j++)
                matrix[i, j] = reader.ReadDouble();
        }
        return matrix;
    }
}
