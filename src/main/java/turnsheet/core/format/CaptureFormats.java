package turnsheet.core.format;

import java.io.IOException;
import java.io.InputStream;
import java.util.List;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.CaptureFormat;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognition;
import turnsheet.core.format.audio.AiffFormat;
import turnsheet.core.format.audio.FlacFormat;
import turnsheet.core.format.audio.WavFormat;
import turnsheet.core.format.text.TableFormat;
import turnsheet.core.format.text.VcdFormat;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;

/** Every format that a capture may have; the first that claims the bytes gets the file. */
public final class CaptureFormats {

  private final List<CaptureFormat> formats;

  CaptureFormats(List<CaptureFormat> formats) {
    this.formats = List.copyOf(formats);
  }

  /** All formats of this version. */
  public static CaptureFormats standard() {
    return new CaptureFormats(
        List.of( //
            new WavFormat(), //
            new AiffFormat(), //
            new FlacFormat(), //
            new VcdFormat(), //
            new TableFormat()));
  }

  /** Says what the file holds, or why it cannot be used. */
  public Recognition recognise(ByteSource source, ReadOptions options) throws IOException {
    try {
      return new Recognition.Accepted(formatOf(source).recognise(source, options));
    } catch (RejectedException e) {
      return new Recognition.Refused(e.rejection());
    }
  }

  /** Opens a file whose recognised contents are a waveform. */
  public SampleReader openSamples(ByteSource source, ReadOptions options)
      throws IOException, RejectedException {
    return formatOf(source).openSamples(source, options);
  }

  /** Opens a file whose recognised contents are edges or periods. */
  public EdgeReader openEdges(ByteSource source, ReadOptions options)
      throws IOException, RejectedException {
    return formatOf(source).openEdges(source, options);
  }

  private CaptureFormat formatOf(ByteSource source) throws IOException, RejectedException {
    byte[] head;
    try (InputStream in = source.open()) {
      head = in.readNBytes(CaptureFormat.HEAD_BYTES);
    }
    if (head.length == 0) {
      throw new RejectedException(
          "empty", "The file is empty (0 bytes): record or export it again.");
    }
    ForeignContent.refuse(head);
    for (CaptureFormat format : formats) {
      if (format.claims(head)) {
        return format;
      }
    }
    throw new RejectedException(
        "unknownFormat",
        "The content is none of the formats that can be measured: upload WAV, AIFF, FLAC, a table"
            + " of numbers as text, or a value change dump.");
  }
}
