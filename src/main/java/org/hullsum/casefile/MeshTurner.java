package org.hullsum.casefile;

import java.io.BufferedWriter;
import java.io.IOException;
import java.io.Writer;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.BitSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.hullsum.mesh.MeshFault;
import org.hullsum.mesh.MeshFile;
import org.hullsum.mesh.MeshTopology;
import org.hullsum.mesh.ObjWriter;
import org.hullsum.mesh.TriangleMesh;

/**
 * Turns the triangles of meshes that face against the others, in copies beside the originals, and
 * makes the text of a case refer to the copies. All else of the text stays as it is.
 *
 * <p>A copy is an OBJ text with the coordinates and the parts of the original, triangle by
 * triangle.
 */
public final class MeshTurner {
  private static final String BYTE_ORDER_MARK = "\uFEFF";
  private static final String SUFFIX = "-oriented.obj";

  private final Path folder;
  private final TextEdits edits = new TextEdits();
  private final Map<String, String> refused = new LinkedHashMap<>();

  /** Meshes that are copied, by the text of their `file`. */
  private final Map<String, Source> sources = new LinkedHashMap<>();

  /** A mesh file and which of its triangles are to be turned. */
  private record Source(TriangleMesh mesh, BitSet turned) {}

  /**
   * What is to be written.
   *
   * @param text of the case
   * @param copies of meshes
   * @param refused patches of which no triangle could be turned, each with the reason
   */
  public record Plan(String text, List<Copy> copies, Map<String, String> refused) {
    public Plan {
      copies = List.copyOf(copies);
      refused = Map.copyOf(refused);
    }
  }

  /** A copy of a mesh that is to be written. */
  public static final class Copy {
    private final Path file;
    private final Source source;

    private Copy(Path file, Source source) {
      this.file = file;
      this.source = source;
    }

    public Path file() {
      return file;
    }

    /** How many triangles are turned. */
    public int turned() {
      return source.turned().cardinality();
    }

    /** Writes it in one step: whoever looks finds all of it or nothing. */
    public void write() throws IOException {
      Path part = file.resolveSibling(file.getFileName() + ".part");
      try {
        try (Writer to =
            new BufferedWriter(Files.newBufferedWriter(part, StandardCharsets.UTF_8))) {
          ObjWriter.write(source.mesh(), source.turned()::get, to);
        }
        Files.move(part, file, StandardCopyOption.ATOMIC_MOVE);
      } finally {
        Files.deleteIfExists(part);
      }
    }
  }

  private MeshTurner(Path folder) {
    this.folder = folder;
  }

  /**
   * Plans the turning of triangles in a case that can be read.
   *
   * @param file the case
   * @param patches the names of those with triangles to be turned
   * @throws IOException if a file can't be read any more
   */
  public static Plan plan(Path file, Set<String> patches) throws IOException {
    String whole = Files.readString(file, StandardCharsets.UTF_8);
    String mark = whole.startsWith(BYTE_ORDER_MARK) ? BYTE_ORDER_MARK : "";
    SourceText source = new SourceText(file.toString(), whole.substring(mark.length()));
    YamlMap root =
        YamlReader.read(source, new ProblemAccumulator())
            .orElseThrow(() -> new IllegalArgumentException(file + " is no case"));
    MeshTurner turner = new MeshTurner(file.toAbsolutePath().getParent());
    Optional<YamlMap> all = root.entry("patches").flatMap(e -> e.value().asMap());
    for (YamlMap.Entry patch : all.map(YamlMap::entries).orElse(List.of())) {
      if (patches.contains(patch.name())) {
        turner.turn(patch);
      }
    }
    List<Copy> copies =
        turner.sources.entrySet().stream()
            .map(e -> new Copy(turner.folder.resolve(copyOf(e.getKey())), e.getValue()))
            .toList();
    return new Plan(mark + turner.edits.appliedTo(source.text()), copies, turner.refused);
  }

  private void turn(YamlMap.Entry patch) throws IOException {
    Optional<YamlMap> mesh =
        patch
            .value()
            .asMap()
            .flatMap(m -> m.entry("surface"))
            .flatMap(e -> e.value().asMap())
            .flatMap(m -> m.entry("mesh"))
            .flatMap(e -> e.value().asMap());
    Optional<YamlMap.Entry> file = mesh.flatMap(m -> m.entry("file"));
    Optional<YamlText> name = file.flatMap(e -> e.value().asText());
    if (name.isEmpty()) {
      refused.put(patch.name(), "it is not a mesh");
      return;
    }
    if (name.get().start() < file.get().key().end()
        || file.get().key().start() < patch.key().start()) {
      refused.put(patch.name(), "its mesh is an alias; write `file` out");
      return;
    }
    Source source = sources.get(name.get().text());
    if (source == null) {
      source = new Source(read(folder.resolve(name.get().text())), new BitSet());
      sources.put(name.get().text(), source);
    }
    Optional<String> part =
        mesh.get().entry("part").flatMap(e -> e.value().asText()).map(YamlText::text);
    mark(source, part);
    String copy = copyOf(name.get().text());
    edits.replace(
        name.get().start(),
        name.get().end(),
        switch (name.get().style()) {
          case SINGLE_QUOTED -> "'" + copy + "'";
          case DOUBLE_QUOTED -> '"' + copy + '"';
          default -> copy;
        });
  }

  private static TriangleMesh read(Path file) throws IOException {
    try {
      return MeshFile.read(file, Runtime.getRuntime().availableProcessors()).build(1);
    } catch (MeshFault fault) {
      throw new IOException(file + " has changed while it was read: " + fault.getMessage(), fault);
    }
  }

  /** Marks the triangles of a part, or of all, that face against the others of it. */
  private static void mark(Source source, Optional<String> part) {
    TriangleMesh mesh = source.mesh();
    int index = part.map(p -> mesh.parts().indexOf(p)).orElse(-1);
    MeshTopology topology = MeshTopology.of(part.isPresent() ? mesh.only(index) : mesh);
    int k = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      if (part.isEmpty() || mesh.part(t) == index) {
        source.turned().set(t, topology.isAgainst(k++));
      }
    }
  }

  private static String copyOf(String name) {
    int slash = Math.max(name.lastIndexOf('/'), name.lastIndexOf('\\'));
    int dot = name.indexOf('.', slash + 2);
    return (dot > 0 ? name.substring(0, dot) : name) + SUFFIX;
  }
}
