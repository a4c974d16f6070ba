package org.hullsum.mesh;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.charset.StandardCharsets;
import java.util.OptionalInt;
import java.util.OptionalLong;

/** Checks that files are refused at the right place. */
final class MeshFaults {
  private MeshFaults() {}

  static MeshFault of(MeshReader reader, byte[] file) {
    return assertThrows(MeshFault.class, () -> RecordedTriangles.of(reader, file));
  }

  static MeshFault of(MeshReader reader, String file) {
    return of(reader, file.getBytes(StandardCharsets.UTF_8));
  }

  static void refusedAtLine(
      MeshReader reader, String file, int line, int column, String partOfMessage) {
    MeshFault fault = of(reader, file);
    assertTrue(fault.getMessage().contains(partOfMessage), fault.getMessage());
    assertEquals(OptionalInt.of(line), fault.line(), fault.getMessage());
    assertEquals(OptionalInt.of(column), fault.column(), fault.getMessage());
    assertEquals(OptionalLong.empty(), fault.offset());
  }

  static void refusedAtByte(MeshReader reader, byte[] file, long offset, String partOfMessage) {
    MeshFault fault = of(reader, file);
    assertTrue(fault.getMessage().contains(partOfMessage), fault.getMessage());
    assertEquals(OptionalLong.of(offset), fault.offset(), fault.getMessage());
    assertEquals(OptionalInt.empty(), fault.line());
  }
}
