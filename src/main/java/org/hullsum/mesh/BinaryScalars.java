package org.hullsum.mesh;

import java.io.IOException;

/** Numbers in binary. */
final class BinaryScalars implements ScalarSource {
  private final ByteCursor bytes;

  BinaryScalars(ByteCursor bytes) {
    this.bytes = bytes;
  }

  @Override
  public double real(ScalarType type) throws IOException, MeshFault {
    return bytes.real(type);
  }

  @Override
  public long whole(ScalarType type) throws IOException, MeshFault {
    return bytes.whole(type);
  }

  @Override
  public void skip(ScalarType type, long count) throws IOException, MeshFault {
    if (count > Long.MAX_VALUE / Long.BYTES) {
      throw fault(count + " numbers are more than a file holds");
    }
    bytes.skip(count * type.size(), "an array");
  }

  @Override
  public boolean hasMore() throws IOException, MeshFault {
    return bytes.peek() != ByteCursor.END;
  }

  @Override
  public MeshFault fault(String message) {
    return bytes.fault(message);
  }
}
