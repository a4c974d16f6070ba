package org.hullsum.mesh;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.ReadableByteChannel;

/** A stretch of bytes from where a cursor stands. */
final class CursorChannel implements ReadableByteChannel {
  private final ByteCursor bytes;
  private final boolean mayEndEarly;
  private long left;

  /**
   * A stretch of the bytes ahead.
   *
   * @param mayEndEarly whether the cursor's end may come before the end of the stretch
   */
  CursorChannel(ByteCursor bytes, long length, boolean mayEndEarly) {
    this.bytes = bytes;
    this.left = length;
    this.mayEndEarly = mayEndEarly;
  }

  @Override
  public int read(ByteBuffer target) throws IOException {
    try {
      if (left == 0) {
        return -1;
      }
      int count = bytes.available((int) Math.min(left, Math.min(target.remaining(), 1 << 14)));
      if (count == 0 && target.hasRemaining()) {
        if (mayEndEarly) {
          return -1;
        }
        throw new CarriedFault(bytes.fault("the data end " + left + " bytes too early"));
      }
      target.put(bytes.array(), bytes.position(), count);
      bytes.advance(count);
      left -= count;
      return count;
    } catch (MeshFault fault) {
      throw new CarriedFault(fault);
    }
  }

  @Override
  public boolean isOpen() {
    return true;
  }

  @Override
  public void close() {}
}
