package turnsheet.core.measure;

import java.io.FilterInputStream;
import java.io.IOException;
import java.io.InputStream;
import turnsheet.core.format.api.ByteSource;

/** Bytes that tell how far into them anyone has read. One thread. */
final class ProgressSource implements ByteSource {

  private static final long STEP = 1 << 20;

  private final ByteSource bytes;
  private final Progress progress;
  private long furthest;

  ProgressSource(ByteSource bytes, Progress progress) {
    this.bytes = bytes;
    this.progress = progress;
  }

  @Override
  public InputStream open() throws IOException {
    return new Counted(bytes.open());
  }

  @Override
  public long length() {
    return bytes.length();
  }

  private void reached(long position) {
    if (position >= furthest + STEP) {
      furthest = position;
      progress.reached(Math.min(1, (double) position / Math.max(1, length())));
    }
  }

  private final class Counted extends FilterInputStream {
    private long position;

    Counted(InputStream in) {
      super(in);
    }

    @Override
    public int read() throws IOException {
      int value = super.read();
      if (value >= 0) {
        reached(++position);
      }
      return value;
    }

    @Override
    public int read(byte[] into, int offset, int length) throws IOException {
      int count = super.read(into, offset, length);
      if (count > 0) {
        position += count;
        reached(position);
      }
      return count;
    }

    @Override
    public long skip(long count) throws IOException {
      long skipped = super.skip(count);
      position += skipped;
      return skipped;
    }
  }
}
