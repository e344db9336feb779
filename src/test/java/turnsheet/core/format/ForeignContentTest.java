package turnsheet.core.format;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.zip.GZIPOutputStream;
import java.util.zip.ZipEntry;
import java.util.zip.ZipOutputStream;
import org.junit.jupiter.api.Test;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognition;
import turnsheet.core.signal.Rejection;

class ForeignContentTest {

  @Test
  void aZipArchiveIsRefusedWhateverItsName() throws Exception {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    try (ZipOutputStream zip = new ZipOutputStream(out)) {
      zip.putNextEntry(new ZipEntry("tone.wav"));
      zip.write(new byte[100]);
    }
    Rejection rejection = refused(out.toByteArray());
    assertThat(rejection.code()).isEqualTo("notACapture");
    assertThat(rejection.message()).contains("zip archive", "unpack it");
  }

  @Test
  void aGzipArchiveIsRefused() throws Exception {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    try (GZIPOutputStream gzip = new GZIPOutputStream(out)) {
      gzip.write(new byte[100]);
    }
    assertThat(refused(out.toByteArray()).message()).contains("gzip archive");
  }

  @Test
  void picturesAndDocumentsAreRefused() throws Exception {
    assertThat(refused(latin("\u00ff\u00d8\u00ff\u00e0..")).message()).contains("JPEG");
    assertThat(refused(latin("\u0089PNG\r\n")).message()).contains("PNG");
    assertThat(refused(latin("%PDF-1.7\n1 0 obj")).message()).contains("PDF");
  }

  @Test
  void compressedAudioIsRefusedByName() throws Exception {
    assertThat(refused(latin("OggS\0\2")).code()).isEqualTo("compressedAudio");
    assertThat(refused(latin("\0\0\0 ftypM4A ")).message()).contains("M4A", "WAV");
    assertThat(refused(latin("\u00ff\u00fb\u0090d")).message()).contains("MP3", "WAV");
    assertThat(refused(latin("ID3\4\0\0\0\0\0\0\u00ff\u00fb\u0090d")).message()).contains("MP3");
  }

  @Test
  void anEmptyFileIsRefused() throws Exception {
    assertThat(refused(new byte[0]).code()).isEqualTo("empty");
  }

  private static byte[] latin(String characters) {
    return characters.getBytes(StandardCharsets.ISO_8859_1);
  }

  private static Rejection refused(byte[] file) throws Exception {
    ByteSource source =
        new ByteSource() {
          @Override
          public InputStream open() {
            return new ByteArrayInputStream(file);
          }

          @Override
          public long length() {
            return file.length;
          }
        };
    Recognition recognition = CaptureFormats.standard().recognise(source, ReadOptions.none());
    assertThat(recognition).isInstanceOf(Recognition.Refused.class);
    return ((Recognition.Refused) recognition).rejection();
  }
}
