package org.hullsum.mesh;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;

/** Writes test files in binary. */
final class ByteWriter {
  private ByteBuffer bytes = ByteBuffer.allocate(1 << 16);

  ByteWriter(ByteOrder order) {
    bytes.order(order);
  }

  ByteWriter text(String text) {
    return bytes(text.getBytes(StandardCharsets.UTF_8));
  }

  ByteWriter bytes(byte... more) {
    bytes.put(more);
    return this;
  }

  ByteWriter shorts(int... numbers) {
    Arrays.stream(numbers).forEach(number -> bytes.putShort((short) number));
    return this;
  }

  ByteWriter ints(int... numbers) {
    Arrays.stream(numbers).forEach(bytes::putInt);
    return this;
  }

  ByteWriter longs(long... numbers) {
    Arrays.stream(numbers).forEach(bytes::putLong);
    return this;
  }

  ByteWriter floats(double... numbers) {
    Arrays.stream(numbers).forEach(number -> bytes.putFloat((float) number));
    return this;
  }

  ByteWriter doubles(double... numbers) {
    Arrays.stream(numbers).forEach(bytes::putDouble);
    return this;
  }

  int size() {
    return bytes.position();
  }

  byte[] toBytes() {
    return Arrays.copyOf(bytes.array(), bytes.position());
  }
}
