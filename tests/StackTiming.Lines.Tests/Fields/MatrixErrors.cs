namespace StackTiming.Lines.Tests.Fields;

/// <summary>Compares matrices as the references' accuracy is stated.</summary>
public static class MatrixErrors
{
    /// <summary>Largest relative error over the entries above a hundredth of the largest.</summary>
    public static double Largest(double[,] actual, double[,] expected)
    {
        var largest = expected.Cast<double>().Max(Math.Abs);
        var error = 0.0;
        for (var i = 0; i < expected.GetLength(0); i++)
        {
            for (var j = 0; j < expected.GetLength(1); j++)
            {
                if (Math.Abs(expected[i, j]) > 0.01 * largest)
                    error = Math.Max(error, Math.Abs(actual[i, j] / expected[i, j] - 1));
            }
        }

        return error;
    }
}
