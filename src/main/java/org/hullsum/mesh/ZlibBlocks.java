package org.hullsum.mesh;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.ReadableByteChannel;
import java.util.zip.DataFormatException;
import java.util.zip.Inflater;

/**
 * Unpacks an array of a VTK file in XML that is packed in blocks: a header with the number of
 * blocks, their size, the size of the last (0 where it is like the others) and the packed size of
 * each, then the blocks, each packed with zlib.
 */
final class ZlibBlocks implements ReadableByteChannel {
  private final ByteCursor packed;
  private final ExpansionLimit limit;
  private final IntList packedSizes = new IntList();
  private final long blockSize;
  private final long lastSize;
  private final Inflater inflater = new Inflater();

  private int block = -1;

  /** Packed bytes of the block that the inflater has not been given. */
  private int packedLeft;

  /** Bytes of the block that are still to come out. */
  private long left;

  ZlibBlocks(ByteCursor packed, ScalarType headerType, ExpansionLimit limit)
      throws IOException, MeshFault {
    this.packed = packed;
    this.limit = limit;
    long blocks = size(headerType);
    blockSize = blocks == 0 ? 0 : size(headerType);
    long partial = blocks == 0 ? 0 : size(headerType);
    lastSize = partial == 0 ? blockSize : partial;
    if (lastSize > blockSize) {
      throw packed.fault("the last block is larger than the others");
    }
    for (long k = 0; k < blocks; k++) {
      long size = size(headerType);
      if (size > Integer.MAX_VALUE) {
        throw packed.fault("a packed block of " + size + " bytes");
      }
      packedSizes.add((int) size, packed);
    }
  }

  private long size(ScalarType type) throws IOException, MeshFault {
    long size = packed.whole(type);
    if (size < 0) {
      throw packed.fault("a size of more than 63 bits");
    }
    return size;
  }

  @Override
  public int read(ByteBuffer target) throws IOException {
    try {
      int count = 0;
      while (count == 0 && target.hasRemaining()) {
        if (left == 0 && !nextBlock()) {
          return -1;
        }
        count = left == 0 ? 0 : inflate(target);
      }
      return count;
    } catch (DataFormatException broken) {
      throw new PackedFault("block " + block + " is not packed with zlib");
    } catch (MeshFault fault) {
      throw new CarriedFault(fault);
    }
  }

  private boolean nextBlock() throws IOException, MeshFault {
    packed.skip(packedLeft, "a packed block");
    if (++block >= packedSizes.size()) {
      return false;
    }
    inflater.reset();
    packedLeft = packedSizes.get(block);
    left = block == packedSizes.size() - 1 ? lastSize : blockSize;
    return true;
  }

  private int inflate(ByteBuffer target) throws IOException, MeshFault, DataFormatException {
    feed();
    int end = target.limit();
    target.limit(target.position() + (int) Math.min(target.remaining(), left));
    int count = inflater.inflate(target);
    target.limit(end);
    left -= count;
    limit.count(0, count);
    if (count == 0 && (inflater.finished() || inflater.needsDictionary())) {
      throw new PackedFault("block " + block + " ends " + left + " bytes too early");
    }
    if (left == 0) {
      checkEnd();
    }
    return count;
  }

  private void feed() throws IOException, MeshFault {
    if (!inflater.needsInput()) {
      return;
    }
    int there = packed.available(Math.min(packedLeft, 1 << 12));
    if (there == 0) {
      throw new PackedFault("block " + block + " breaks off");
    }
    // The inflater reads from the buffer, which stays as it is until more is asked of the cursor.
    inflater.setInput(packed.array(), packed.position(), there);
    packed.advance(there);
    packedLeft -= there;
    limit.count(there, 0);
  }

  /** Has the inflater compare its checksum, behind the last byte of the block. */
  private void checkEnd() throws IOException, MeshFault, DataFormatException {
    byte[] none = new byte[1];
    while (!inflater.finished()) {
      feed();
      if (inflater.inflate(none) > 0) {
        throw new PackedFault("block " + block + " unpacks to more bytes than its header says");
      }
    }
  }

  @Override
  public boolean isOpen() {
    return true;
  }

  @Override
  public void close() {
    inflater.end();
  }
}
