package org.hullsum.mesh;

import java.io.IOException;
import java.nio.channels.ReadableByteChannel;

/** Reads a file of one format and tells what it finds. */
interface MeshReader {
  /**
   * Reads one file.
   *
   * @param file stands at the first byte; read to its end, or as far as triangles may stand in it
   * @throws MeshFault where the file is not what its format says; the sink has then been told some
   *     of it
   */
  void read(ReadableByteChannel file, TriangleSink sink) throws IOException, MeshFault;
}
