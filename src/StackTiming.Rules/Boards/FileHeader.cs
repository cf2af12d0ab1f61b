using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.Boards;

/// <summary>What every structured file may begin with: <c>format: 1</c> and <c>units: { length: um, time: ps }</c>.</summary>
public static class FileHeader
{
    /// <summary>Reads the header of a file.</summary>
    /// <param name="map">The file's mapping.</param>
    /// <param name="problems">Where problems go.</param>
    /// <returns>A reader of the mapping with the file's units, that knows the keys of the header.</returns>
    public static MapReader Open(DataMap map, ProblemList problems)
    {
        var units = DefaultUnitsReader.Read(new MapReader(map, DefaultUnits.None, problems));
        var reader = new MapReader(map, units, problems);
        FormatVersion.Check(reader);
        reader.Has("units");
        return reader;
    }
}
