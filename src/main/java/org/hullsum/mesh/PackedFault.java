package org.hullsum.mesh;

import java.io.IOException;

/**
 * Bytes that cannot be unpacked (gzip, zlib, base64), told by a channel, which does not know where
 * in the file it stands; whoever reads from the channel turns it into a {@link MeshFault}.
 */
final class PackedFault extends IOException {
  private static final long serialVersionUID = 1L;

  PackedFault(String message) {
    super(message);
  }
}
