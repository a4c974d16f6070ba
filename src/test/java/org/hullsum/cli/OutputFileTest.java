package org.hullsum.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class OutputFileTest {
  private static final byte[] BYTES = "document\n".getBytes(StandardCharsets.UTF_8);

  @Test
  void anOldFileIsReplacedAndNothingElseIsLeft(@TempDir Path folder) throws IOException {
    Path file = folder.resolve("out.json");
    Files.writeString(file, "an older and much longer document");
    assertEquals(Optional.empty(), OutputFile.write(file.toString(), BYTES));
    assertEquals("document\n", Files.readString(file));
    try (Stream<Path> left = Files.list(folder)) {
      assertEquals(1, left.count());
    }
  }

  @Test
  void aLinkStaysALinkAndItsTargetIsWritten(@TempDir Path folder) throws IOException {
    Path target = folder.resolve("target.json");
    Files.writeString(target, "old");
    Path link = Files.createSymbolicLink(folder.resolve("link.json"), target);
    assertEquals(Optional.empty(), OutputFile.write(link.toString(), BYTES));
    assertTrue(Files.isSymbolicLink(link));
    assertEquals("document\n", Files.readString(target));
  }

  @Test
  void aFullDeviceIsToldWithItsName() {
    Path full = Path.of("/dev/full");
    assumeTrue(Files.exists(full), "only where there is such a device");
    Optional<String> failure = OutputFile.write(full.toString(), BYTES);
    assertTrue(failure.orElse("").startsWith("/dev/full: can't be written: "), failure.toString());
    assertTrue(Files.exists(full));
  }

  @Test
  void aNameThatIsNoPathIsToldAsSuch() {
    assertTrue(OutputFile.write("a\u0000b", BYTES).isPresent());
  }
}
