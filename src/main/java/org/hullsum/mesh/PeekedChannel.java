package org.hullsum.mesh;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.ReadableByteChannel;
import java.util.Arrays;

/** A channel whose first bytes can be looked at before they are read. */
final class PeekedChannel implements ReadableByteChannel {
  private final ReadableByteChannel channel;
  private final ByteBuffer head;

  PeekedChannel(ReadableByteChannel channel, int length) throws IOException {
    this.channel = channel;
    this.head = ByteBuffer.allocate(length);
    boolean more = true;
    while (more && head.hasRemaining()) {
      more = channel.read(head) >= 0;
    }
    head.flip();
  }

  /** The first bytes: fewer than were asked for where the channel has no more. */
  byte[] head() {
    return Arrays.copyOf(head.array(), head.limit());
  }

  @Override
  public int read(ByteBuffer target) throws IOException {
    if (!head.hasRemaining()) {
      return channel.read(target);
    }
    int count = Math.min(head.remaining(), target.remaining());
    int end = head.limit();
    head.limit(head.position() + count);
    target.put(head);
    head.limit(end);
    return count;
  }

  @Override
  public boolean isOpen() {
    return channel.isOpen();
  }

  @Override
  public void close() throws IOException {
    channel.close();
  }
}
