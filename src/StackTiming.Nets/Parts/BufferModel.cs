using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Parts;

/// <summary>What a pin does electrically: it drives, receives, or both.</summary>
/// <param name="Name">Its name in the parts file.</param>
/// <param name="At">Where the file states it.</param>
/// <param name="Driver">How it drives, or null where it cannot.</param>
/// <param name="Receiver">How it receives, or null where it does not.</param>
public sealed record BufferModel(string Name, FilePosition At, DriverModel? Driver, ReceiverModel? Receiver);
