using System.CommandLine;
using System.Globalization;
using System.Text.Json;
using StackTiming.Nets.Sketches;
using StackTiming.Reports.Figures;
using StackTiming.Stackups.Reading;
using StackTiming.Terminal;
using StackTiming.Waves.Metrics;
using StackTiming.Waves.Sketches;

namespace StackTiming.Commands;

/// <summary><c>stacktiming net FILE</c>: the waveforms and metrics of a net sketch, or of one net of a board.</summary>
internal static class NetCommand
{
    /// <summary>The command.</summary>
    /// <param name="cancellation">Cancelled when the user wants to stop.</param>
    public static Command Create(CancellationToken cancellation)
    {
        var file = new Argument<string>("file") { Description = "A net sketch (*.net.yaml), or a board file together with --net." };
        var net = new Option<string?>("--net") { Description = "A net of the board.", HelpName = "name" };
        var driver = new Option<string?>("--driver") { Description = "The part or pin that drives it, where several can.", HelpName = "pin" };
        var falling = new Option<bool>("--falling") { Description = "Send a falling edge into the net of a board." };
        var json = new Option<bool>("--json") { Description = "Print JSON instead of a table." };
        var waveforms = new Option<bool>("--waveforms") { Description = "With --json: print the waveforms as well." };
        var figure = new Option<string?>("--figure") { Description = "Draw the waveforms.", HelpName = "file.svg|png" };
        var method = MethodOption.Create(MethodOption.Field, withBoth: false);
        var command = new Command("net", "Waveforms of a net: first crossing, flight time, overshoot, ringback and settling at each receiver.")
        {
            file, net, driver, falling, json, waveforms, figure, method,
        };
        command.SetAction(result =>
        {
            var (output, error) = (result.InvocationConfiguration.Output, result.InvocationConfiguration.Error);
            var problems = new ProblemList();
            var calculator = MethodOption.Calculator(result.GetRequiredValue(method));
            var subject = result.GetValue(net) is { } name
                ? BoardNetSubject.Find(result.GetRequiredValue(file), name, result.GetValue(driver), !result.GetValue(falling), calculator, problems, cancellation)
                : Sketch(result.GetRequiredValue(file), calculator, problems);
            ProblemPrinter.Print(problems, error);
            if (subject is null)
                return ExitCode.WrongInput;
            var response = NetResponse.Solve(subject.Network);
            if (!Outputs.Write(error, cancellation, (result.GetValue(figure), s => Draw(subject, response, result.GetValue(figure)!, s))))
                return ExitCode.WrongInput;
            if (result.GetValue(json))
                output.WriteLine(Json(subject, response, result.GetValue(waveforms)));
            else
                Print(subject, response, output);
            return ExitCode.Holds;
        });
        HelpWithExamples.AddTo(command, () => """
            Examples:
              stacktiming net clock.net.yaml
              stacktiming net clock.net.yaml --json --waveforms > clock.json
              stacktiming net board.yaml --net CLK_ADC --figure clk.svg
            """);
        return command;
    }

    private static NetSubject? Sketch(string path, Lines.Solutions.ILineCalculator calculator, ProblemList problems)
    {
        if (InputFileLoader.Load(path, default, problems) is not { } file || NetSketchReader.Read(file, problems) is not { } sketch)
            return null;
        return new SketchNetwork(calculator).Build(sketch, problems) is { } network
            ? new NetSubject(Path.GetFileName(path), network, [.. network.Receivers.Select(r => network.NodeNames[r.Node])]) : null;
    }

    private static void Print(NetSubject subject, NetResponse response, TextWriter output)
    {
        var table = Tables.Of("Receiver", ">Mid ps", ">vih/vil ps", ">Last ps", ">Flight ps", ">Settled ps", ">Max V", ">Min V", ">Final V", ">Over V", ">Ringback V", "First wave");
        for (var i = 0; i < response.Metrics.Length; i++)
        {
            var m = response.Metrics[i];
            table.Add(
                subject.Receivers[i], Picoseconds(m.FirstMidSeconds), Picoseconds(m.FirstVihSeconds), Picoseconds(m.FinalVihSeconds),
                Picoseconds(m.FlightTimeSeconds), Picoseconds(m.SettleSeconds), Volts(m.MaxVolts), Volts(m.MinVolts), Volts(m.FinalVolts),
                Volts(m.OvershootVolts), Volts(m.RingbackVolts), m.FirstIncident switch { true => "yes", false => "no", null => "" });
        }
        output.WriteLine(ProblemPrinter.Printable(subject.Name));
        Tables.On(output).Write(table);
    }

    private static string Json(NetSubject subject, NetResponse response, bool waveforms) => JsonText.Of(writer =>
    {
        writer.WriteStartObject();
        writer.WriteString("net", subject.Name);
        writer.WriteString("method", response.Response.Engine);
        writer.WriteStartArray("receivers");
        for (var i = 0; i < response.Metrics.Length; i++)
        {
            var m = response.Metrics[i];
            writer.WriteStartObject();
            writer.WriteString("at", subject.Receivers[i]);
            JsonText.Number(writer, "t_first_mid_s", m.FirstMidSeconds);
            JsonText.Number(writer, "t_first_vih_s", m.FirstVihSeconds);
            JsonText.Number(writer, "t_final_vih_s", m.FinalVihSeconds);
            JsonText.Number(writer, "v_max_v", m.MaxVolts);
            JsonText.Number(writer, "v_min_v", m.MinVolts);
            JsonText.Number(writer, "overshoot_v", m.OvershootVolts);
            JsonText.Number(writer, "ringback_v", m.RingbackVolts);
            JsonText.Number(writer, "v_final_v", m.FinalVolts);
            JsonText.Number(writer, "t_settle_5pct_s", m.SettleSeconds);
            JsonText.Number(writer, "flight_time_s", m.FlightTimeSeconds);
            if (m.FirstIncident is { } first)
                writer.WriteBoolean("first_incident", first);
            if (waveforms)
                WriteWaveform(writer, response, i);
            writer.WriteEndObject();
        }
        writer.WriteEndArray();
        writer.WriteEndObject();
    });

    // Two thousand samples show every corner of a waveform and keep the output readable by other programs.
    private static void WriteWaveform(Utf8JsonWriter writer, NetResponse response, int receiver)
    {
        const int most = 2000;
        var step = response.Response.StepSeconds;
        var count = (int)(response.Network.DurationSeconds / step) + 1;
        var stride = Math.Max(1, count / most);
        writer.WriteStartArray("time_s");
        for (var k = 0; k < count; k += stride)
            writer.WriteNumberValue(k * step);
        writer.WriteEndArray();
        writer.WriteStartArray("voltage_v");
        for (var k = 0; k < count; k += stride)
            writer.WriteNumberValue(response.Response.Receivers[receiver].At(k * step, step));
        writer.WriteEndArray();
    }

    private static void Draw(NetSubject subject, NetResponse response, string path, Stream stream)
    {
        var drawing = NetFigure.Of(subject, response);
        if (path.EndsWith(".png", StringComparison.OrdinalIgnoreCase))
            FigureFile.WritePng(drawing, 720, 2, stream);
        else
            FigureFile.WriteSvg(drawing, 720, stream);
    }

    private static string Picoseconds(double? seconds) => seconds is { } s ? (s * 1e12).ToString("0.00", CultureInfo.InvariantCulture) : "–";

    private static string Volts(double? volts) => volts is { } v ? (v + 0.0).ToString("0.0000;-0.0000;0.0000", CultureInfo.InvariantCulture) : "–";
}
