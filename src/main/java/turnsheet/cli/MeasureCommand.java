package turnsheet.cli;

import java.io.FileDescriptor;
import java.io.FileOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import org.jspecify.annotations.Nullable;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.format.api.Recognition;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Measurement;
import turnsheet.core.measure.Outcome;
import turnsheet.core.measure.Progress;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.Rejection;
import turnsheet.document.ReadingDocument;

/** {@code measure FILE}: figures of one capture on the shell, without the service. */
public final class MeasureCommand {

  /** The figures were printed. */
  public static final int MEASURED = 0;

  /** The arguments make no sense; how to use the command went to the error stream. */
  public static final int WRONG_USAGE = 2;

  /** The capture cannot be measured; the sentence went to the error stream. */
  public static final int REJECTED = 3;

  private MeasureCommand() {}

  /** Runs the command on the standard streams, in UTF-8 whatever the locale: JSON asks for it. */
  public static int run(String[] args) {
    PrintStream out =
        new PrintStream(new FileOutputStream(FileDescriptor.out), false, StandardCharsets.UTF_8);
    PrintStream err =
        new PrintStream(new FileOutputStream(FileDescriptor.err), true, StandardCharsets.UTF_8);
    int status = run(args, out, err);
    out.flush();
    return status;
  }

  /**
   * Runs the command.
   *
   * @param args what follows the word {@code measure}
   * @return the exit status
   */
  public static int run(String[] args, PrintStream out, PrintStream err) {
    MeasureArguments arguments;
    try {
      arguments = MeasureArguments.parse(args);
    } catch (IllegalArgumentException e) {
      err.println(e.getMessage());
      err.print(MeasureArguments.USAGE);
      return WRONG_USAGE;
    }
    Path file = Path.of(arguments.file());
    if (!Files.isRegularFile(file) || !Files.isReadable(file)) {
      err.println("There is no readable file " + arguments.file() + ".");
      return WRONG_USAGE;
    }
    try {
      return measure(file, arguments, out, err);
    } catch (IOException e) {
      err.println("The file could not be read to its end: " + e.getMessage());
      return REJECTED;
    }
  }

  private static int measure(
      Path file, MeasureArguments arguments, PrintStream out, PrintStream err) throws IOException {
    HashingSource source = new HashingSource(file);
    CaptureFormats formats = CaptureFormats.standard();
    ReadOptions options = new ReadOptions(arguments.channel(), null, null, null);
    Recognition recognition = formats.recognise(source, options);
    if (recognition instanceof Recognition.Refused refused) {
      return rejected(refused.rejection(), err);
    }
    Recognised recognised = ((Recognition.Accepted) recognition).recognised();
    MeasureSettings settings = settings(arguments, recognised);
    Outcome outcome =
        new Measurement(formats).measure(source, source.sha256(), options, settings, Progress.NONE);
    if (outcome instanceof Outcome.Refused refused) {
      return rejected(refused.rejection(), err);
    }
    Reading reading = ((Outcome.Measured) outcome).reading();
    if (arguments.json()) {
      out.println(ReadingDocument.toPrettyJson(reading));
    } else {
      out.print(ReadingTable.of(reading, recognised.guesses()));
    }
    return MEASURED;
  }

  private static MeasureSettings settings(MeasureArguments arguments, Recognised recognised) {
    MeasureSettings base = kindSettings(arguments, recognised.contents());
    return base.onChannel(recognised.channel());
  }

  private static MeasureSettings kindSettings(MeasureArguments arguments, Contents contents) {
    Double toneHz = arguments.toneHz();
    if (toneHz != null) {
      return MeasureSettings.tone(toneHz);
    }
    double pulses = required(arguments.pulsesPerSecond());
    CaptureKind kind = contents == Contents.WAVEFORM ? CaptureKind.TACHOMETER : CaptureKind.EDGES;
    return kind == CaptureKind.EDGES
        ? MeasureSettings.edges(pulses, arguments.teeth())
        : MeasureSettings.tachometer(pulses, arguments.teeth());
  }

  private static double required(@Nullable Double value) {
    if (value == null) {
      throw new IllegalArgumentException("no rate");
    }
    return value;
  }

  private static int rejected(Rejection rejection, PrintStream err) {
    err.println(rejection.message());
    return REJECTED;
  }
}
