namespace StackTiming.Rules.Results;

/// <summary>An input file of a check.</summary>
/// <param name="Role">What it is: <c>board</c>, <c>stackup</c>, <c>lengths</c>, <c>parts</c>, <c>rules</c>, <c>waivers</c>, <c>coupons</c>.</param>
/// <param name="Path">Its path as messages show it.</param>
/// <param name="Sha256">SHA-256 of its bytes, lower-case hexadecimal.</param>
public sealed record InputDigest(string Role, string Path, string Sha256);
