using System.Globalization;
using StackTiming.Benchmarks;

// "generate FOLDER NETS" writes a large board to time the whole program with; everything else goes to the benchmark switcher.
if (args is ["generate", var folder, var nets])
{
    Console.WriteLine(GeneratedBoard.Write(folder, int.Parse(nets, CultureInfo.InvariantCulture)));
    return;
}

// "field-solver" prints the table of the solver's errors and times.
if (args is ["field-solver"])
{
    FieldSolverTable.Write(Console.Out);
    return;
}
BenchmarkDotNet.Running.BenchmarkSwitcher.FromAssembly(typeof(GeneratedBoard).Assembly).Run(args);
