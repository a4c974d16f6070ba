package org.hullsum.mesh;

import java.io.IOException;
import java.nio.channels.ReadableByteChannel;
import java.nio.channels.SeekableByteChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import java.util.OptionalInt;

/**
 * Reads a file of any format that is known, packed with gzip or not: by what it begins with, and
 * only where that does not say by the ending of its name. Offsets in faults of a packed file count
 * the bytes as unpacked.
 */
public final class MeshFile {
  private static final int GZIP_MAGIC_1 = 0x1f;
  private static final int GZIP_MAGIC_2 = 0x8b;

  private MeshFile() {}

  /**
   * Reads a file.
   *
   * @param threads that may be used; what is read does not depend on it
   * @return what was gathered, to be scaled and built
   */
  public static TriangleMeshBuilder read(Path path, int threads) throws IOException, MeshFault {
    OptionalInt records = records(path);
    if (records.isPresent()) {
      return StlRecords.read(path, records.getAsInt(), threads);
    }
    TriangleMeshBuilder builder = new TriangleMeshBuilder();
    read(path, builder);
    return builder;
  }

  /** The number of triangles where the file is nothing but the records of binary STL. */
  private static OptionalInt records(Path path) throws IOException {
    try (SeekableByteChannel file = Files.newByteChannel(path)) {
      byte[] head = new PeekedChannel(file, MeshFormat.HEAD).head();
      String name = String.valueOf(path.getFileName());
      return !isPacked(head)
              && MeshFormat.of(head, file.size(), name).equals(Optional.of(MeshFormat.STL))
          ? StlRecords.count(head, file.size())
          : OptionalInt.empty();
    }
  }

  private static boolean isPacked(byte[] head) {
    return head.length >= 2 && (head[0] & 0xff) == GZIP_MAGIC_1 && (head[1] & 0xff) == GZIP_MAGIC_2;
  }

  /**
   * Reads a file.
   *
   * @return the format that the file turned out to have
   */
  static MeshFormat read(Path path, TriangleSink sink) throws IOException, MeshFault {
    try (SeekableByteChannel file = Files.newByteChannel(path)) {
      return read(file, file.size(), String.valueOf(path.getFileName()), sink);
    }
  }

  /**
   * Reads what a channel gives.
   *
   * @param size bytes that the channel has, negative where it is not known
   * @param name the name of the file, for its ending
   */
  static MeshFormat read(ReadableByteChannel channel, long size, String name, TriangleSink sink)
      throws IOException, MeshFault {
    try {
      PeekedChannel file = new PeekedChannel(channel, MeshFormat.HEAD);
      byte[] head = file.head();
      if (!isPacked(head)) {
        return readPlain(file, size, name, sink);
      }
      try (PeekedChannel plain = new PeekedChannel(new GunzipChannel(file), MeshFormat.HEAD)) {
        return readPlain(plain, -1, name, sink);
      }
    } catch (PackedFault broken) {
      throw MeshFault.atByte(0, broken.getMessage());
    }
  }

  private static MeshFormat readPlain(PeekedChannel file, long size, String name, TriangleSink sink)
      throws IOException, MeshFault {
    byte[] head = file.head();
    if (head.length == 0) {
      throw MeshFault.atByte(0, "the file is empty");
    }
    MeshFormat format =
        MeshFormat.of(head, size, name)
            .orElseThrow(
                () ->
                    MeshFault.atByte(
                        0,
                        "neither the content nor the ending of the file's name says that it is STL,"
                            + " PLY, OBJ or VTK"));
    MeshReader reader =
        switch (format) {
          case STL -> StlReader::read;
          case PLY -> PlyReader::read;
          case OBJ -> ObjReader::read;
          case VTK_LEGACY -> VtkLegacyReader::read;
          case VTK_XML -> VtkXmlReader::read;
        };
    reader.read(file, sink);
    return format;
  }
}
