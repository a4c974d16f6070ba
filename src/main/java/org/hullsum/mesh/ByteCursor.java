package org.hullsum.mesh;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.channels.ReadableByteChannel;

/**
 * Reads a channel through one buffer, byte by byte, number by number, or by handing out the buffer.
 * Little endian until told otherwise.
 */
final class ByteCursor implements FaultPlace {
  /** Large enough that the system call does not show. */
  static final int FILE_BUFFER = 1 << 21;

  /** For the arrays inside a file that is itself read through a large buffer. */
  static final int ARRAY_BUFFER = 1 << 14;

  static final int END = -1;

  /** Tells the place of a fault from the bytes before it. */
  interface Places {
    MeshFault fault(long offset, String message);
  }

  private final ReadableByteChannel channel;
  private final Places places;
  private final byte[] buffer;
  private final ByteBuffer view;

  /** Bytes of the channel before the buffer's first. */
  private long base;

  private int position;
  private int limit;
  private boolean ended;

  ByteCursor(ReadableByteChannel channel) {
    this(channel, FILE_BUFFER, MeshFault::atByte);
  }

  ByteCursor(ReadableByteChannel channel, int bufferSize, Places places) {
    this.channel = channel;
    this.places = places;
    this.buffer = new byte[bufferSize];
    this.view = ByteBuffer.wrap(buffer).order(ByteOrder.LITTLE_ENDIAN);
  }

  void order(ByteOrder order) {
    view.order(order);
  }

  /** Bytes before the next one. */
  long offset() {
    return base + position;
  }

  @Override
  public MeshFault fault(String message) {
    return places.fault(offset(), message);
  }

  MeshFault faultAt(long offset, String message) {
    return places.fault(offset, message);
  }

  /** The next byte without passing it, or {@link #END}. */
  int peek() throws IOException, MeshFault {
    if (position == limit && available(1) == 0) {
      return END;
    }
    return buffer[position] & 0xff;
  }

  /** The byte after the next, or {@link #END}. */
  int peekSecond() throws IOException, MeshFault {
    return available(2) < 2 ? END : buffer[position + 1] & 0xff;
  }

  /** Passes bytes that {@link #peek} or {@link #available} has shown to be there. */
  void advance(int count) {
    position += count;
  }

  /** The buffer; what is to come begins at {@link #position}. */
  byte[] array() {
    return buffer;
  }

  int position() {
    return position;
  }

  /**
   * Fetches bytes into the buffer.
   *
   * @param wanted at most the size of the buffer
   * @return how many are there, up to {@code wanted}; fewer only at the end of the channel
   */
  int available(int wanted) throws IOException, MeshFault {
    if (limit - position < wanted && !ended) {
      fetch(wanted);
    }
    return Math.min(limit - position, wanted);
  }

  private void fetch(int wanted) throws IOException, MeshFault {
    System.arraycopy(buffer, position, buffer, 0, limit - position);
    base += position;
    limit -= position;
    position = 0;
    while (limit < wanted && !ended) {
      view.limit(buffer.length).position(limit);
      int count = read();
      ended = count < 0;
      limit += Math.max(0, count);
    }
    view.clear();
  }

  private int read() throws IOException, MeshFault {
    try {
      return channel.read(view);
    } catch (CarriedFault carried) {
      throw carried.fault();
    } catch (PackedFault broken) {
      throw places.fault(base + limit, broken.getMessage());
    }
  }

  /** Passes bytes unread. */
  void skip(long count, String what) throws IOException, MeshFault {
    long left = count;
    while (left > 0) {
      int here = available((int) Math.min(left, buffer.length));
      if (here == 0) {
        throw fault("the file ends " + left + " bytes before the end of " + what);
      }
      position += here;
      left -= here;
    }
  }

  private int require(int size) throws IOException, MeshFault {
    if (limit - position < size && available(size) < size) {
      throw fault("the file ends inside a number of " + size + " bytes");
    }
    int at = position;
    position += size;
    return at;
  }

  /** The next number, as near as a double comes to it. */
  double real(ScalarType type) throws IOException, MeshFault {
    return switch (type) {
      case FLOAT32 -> view.getFloat(require(Float.BYTES));
      case FLOAT64 -> view.getDouble(require(Double.BYTES));
      default -> whole(type);
    };
  }

  /**
   * The next number where a whole one is wanted: an index, a count. Whole numbers above the largest
   * {@code long} come out negative.
   */
  long whole(ScalarType type) throws IOException, MeshFault {
    return switch (type) {
      case INT8 -> view.get(require(1));
      case UINT8 -> view.get(require(1)) & 0xff;
      case INT16 -> view.getShort(require(Short.BYTES));
      case UINT16 -> view.getShort(require(Short.BYTES)) & 0xffff;
      case INT32 -> view.getInt(require(Integer.BYTES));
      case UINT32 -> view.getInt(require(Integer.BYTES)) & 0xffffffffL;
      case INT64, UINT64 -> view.getLong(require(Long.BYTES));
      case FLOAT32, FLOAT64 -> wholeOf(real(type));
    };
  }

  private long wholeOf(double value) throws MeshFault {
    long whole = (long) value;
    if (whole != value) {
      throw fault("a whole number is wanted, not " + value);
    }
    return whole;
  }
}
