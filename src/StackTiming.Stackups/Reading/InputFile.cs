namespace StackTiming.Stackups.Reading;

/// <summary>The text of an input file, decoded, with the digest of its bytes.</summary>
/// <param name="Path">The path as messages show it.</param>
/// <param name="Text">The text.</param>
/// <param name="Sha256">SHA-256 of the bytes, lower-case hexadecimal.</param>
public sealed record InputFile(string Path, string Text, string Sha256);
