package org.hullsum.mesh;

import java.io.EOFException;
import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.channels.ReadableByteChannel;
import java.util.zip.GZIPInputStream;
import java.util.zip.ZipException;

/** Unpacks gzip (RFC 1952), several members one behind the other too, within a limit. */
final class GunzipChannel implements ReadableByteChannel {
  private static final int BUFFER = 1 << 16;

  private final ExpansionLimit limit = new ExpansionLimit();
  private final byte[] unpacked = new byte[BUFFER];
  private final PackedStream packed;
  private final InputStream stream;

  GunzipChannel(ReadableByteChannel file) throws IOException {
    this.packed = new PackedStream(file);
    try {
      this.stream = new GZIPInputStream(packed, BUFFER);
    } catch (ZipException | EOFException broken) {
      throw new PackedFault("the header of the gzip data is broken");
    }
  }

  @Override
  public int read(ByteBuffer target) throws IOException {
    try {
      int count = stream.read(unpacked, 0, Math.min(unpacked.length, target.remaining()));
      if (count > 0) {
        target.put(unpacked, 0, count);
        limit.count(packed.takeCount(), count);
      }
      return count;
    } catch (ZipException broken) {
      throw new PackedFault("the gzip data are broken (" + broken.getMessage() + ")");
    } catch (EOFException cutShort) {
      throw new PackedFault("the gzip data break off");
    }
  }

  @Override
  public boolean isOpen() {
    return true;
  }

  @Override
  public void close() throws IOException {
    stream.close();
  }

  /** The packed file as the platform's stream wants it, counted. */
  private static final class PackedStream extends InputStream {
    private final ReadableByteChannel file;
    private long count;

    PackedStream(ReadableByteChannel file) {
      this.file = file;
    }

    /** The bytes that were read since this was asked last. */
    long takeCount() {
      long taken = count;
      count = 0;
      return taken;
    }

    @Override
    public int read() throws IOException {
      byte[] one = new byte[1];
      return read(one, 0, 1) < 0 ? -1 : one[0] & 0xff;
    }

    @Override
    public int read(byte[] into, int from, int length) throws IOException {
      int read = file.read(ByteBuffer.wrap(into, from, length));
      count += Math.max(0, read);
      return read;
    }

    /** Has the platform look for another member behind the last. */
    @Override
    public int available() {
      return 1;
    }
  }
}
