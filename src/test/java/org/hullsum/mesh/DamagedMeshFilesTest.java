package org.hullsum.mesh;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class DamagedMeshFilesTest {
  private static final Path FOLDER = Path.of("src", "test", "resources", "mesh");
  private static final int FILES = 3000;
  private static final int SEED = 3;

  @Test
  void everySoundFileIsRead() throws Exception {
    try (Stream<Path> files = Files.list(FOLDER)) {
      List<Path> all = files.sorted().toList();
      assertTrue(all.size() >= 20, "only " + all.size() + " files");
      for (Path file : all) {
        RecordedTriangles told = new RecordedTriangles();
        MeshFile.read(file, told);
        assertTrue(told.triangleCount() >= 4, file.toString());
        if (told.triangleCount() == 12) {
          assertEquals(1, told.volume(), 1e-15, file.toString());
        }
      }
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {".stl", ".ply", ".obj", ".vtk", ".vtp", ".vtu"})
  void damagedFilesAreReadOrRefusedWithAPlace(String ending) throws Exception {
    MeshFileDamage damage = MeshFileDamage.of(FOLDER, SEED, List.of(ending));
    for (int k = 0; k < FILES; k++) {
      damage.once();
    }
    assertEquals(FILES, damage.read() + damage.refused());
    assertTrue(damage.read() > 0 && damage.refused() > 0);
  }
}
