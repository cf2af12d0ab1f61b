using System.Reflection;
using StackTiming.Reports.Results;

namespace StackTiming.Terminal;

/// <summary>Name and version of this program.</summary>
internal static class ToolVersion
{
    /// <summary>As results and reports carry it.</summary>
    public static ToolIdentity Identity { get; } = new(
        "StackTiming", typeof(ToolVersion).Assembly.GetCustomAttribute<AssemblyInformationalVersionAttribute>()?.InformationalVersion ?? "0");
}
