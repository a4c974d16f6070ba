package org.hullsum.casefile;

import java.io.BufferedWriter;
import java.io.IOException;
import java.io.Writer;
import java.nio.charset.StandardCharsets;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.BitSet;
import java.util.HashSet;
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
import org.hullsum.model.Patch;
import org.hullsum.model.PatchSurface;

/**
 * Turns the triangles of meshes that face against the others, in copies beside the originals, and
 * makes the text of a case refer to the copies. All else of the text stays as it is.
 *
 * <p>A copy is an OBJ text with the coordinates and the parts of the original, triangle by
 * triangle.
 */
public final class MeshTurner {
  private static final String BYTE_ORDER_MARK = "\uFEFF";
  private static final String SUFFIX = "-oriented";
  private static final String ENDING = ".obj";

  private final Path folder;
  private final int threads;
  private final TextEdits edits = new TextEdits();
  private final Map<String, String> refused = new LinkedHashMap<>();

  /** Which triangles are to be turned, by the patch. */
  private final Map<String, Against> against;

  /** Meshes that are copied, by their files. */
  private final Map<Path, Source> sources = new LinkedHashMap<>();

  private final Set<Path> targets = new HashSet<>();

  /** The triangles of a patch that face against the others, numbered within its part. */
  private static final class Against implements PatchSurface.Visitor<BitSet> {
    private final BitSet triangles;

    Against(PatchSurface surface) {
      this.triangles = surface.accept(this);
    }

    @Override
    public BitSet formulas(PatchSurface.Formulas surface) {
      return new BitSet();
    }

    @Override
    public BitSet triangles(PatchSurface.Triangles surface) {
      MeshTopology topology = surface.topology();
      BitSet found = new BitSet();
      for (int t = 0; t < topology.mesh().triangleCount(); t++) {
        found.set(t, topology.isAgainst(t));
      }
      return found;
    }
  }

  /** A mesh file, which of its triangles are to be turned, and where the copy goes. */
  private record Source(TriangleMesh mesh, BitSet turned, Path target) {}

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
    private final Source source;

    private Copy(Source source) {
      this.source = source;
    }

    public Path file() {
      return source.target();
    }

    /** How many triangles are turned. */
    public int turned() {
      return source.turned().cardinality();
    }

    /**
     * Writes it in one step: whoever looks finds all of it or nothing.
     *
     * @return whether it is new; else the very same was there
     * @throws FileAlreadyExistsException if another file is there, which is left as it is
     */
    public boolean write() throws IOException {
      Path file = file();
      Path part = file.resolveSibling(file.getFileName() + ".part");
      try {
        try (Writer to =
            new BufferedWriter(Files.newBufferedWriter(part, StandardCharsets.UTF_8))) {
          ObjWriter.write(source.mesh(), source.turned()::get, to);
        }
        if (!Files.exists(file)) {
          Files.move(part, file, StandardCopyOption.ATOMIC_MOVE);
          return true;
        }
        if (!Files.isRegularFile(file) || Files.mismatch(part, file) >= 0) {
          throw new FileAlreadyExistsException(file.toString());
        }
        return false;
      } finally {
        Files.deleteIfExists(part);
      }
    }
  }

  private MeshTurner(Path folder, int threads, Map<String, Against> against) {
    this.folder = folder;
    this.threads = threads;
    this.against = against;
  }

  /**
   * Plans the turning of triangles in a case that can be read.
   *
   * @param file the case
   * @param patches the names of those with triangles to be turned
   * @param threads that may be used
   * @throws IOException if a file can't be read any more
   */
  public static Plan plan(Path file, Set<String> patches, int threads) throws IOException {
    String whole = Files.readString(file, StandardCharsets.UTF_8);
    String mark = whole.startsWith(BYTE_ORDER_MARK) ? BYTE_ORDER_MARK : "";
    SourceText source = new SourceText(file.toString(), whole.substring(mark.length()));
    YamlMap root =
        YamlReader.read(source, new ProblemAccumulator())
            .orElseThrow(() -> new IllegalArgumentException(file + " is no case"));
    MeshTurner turner =
        new MeshTurner(file.toAbsolutePath().getParent(), threads, against(file, patches, threads));
    Optional<YamlMap> all = root.entry("patches").flatMap(e -> e.value().asMap());
    for (YamlMap.Entry patch : all.map(YamlMap::entries).orElse(List.of())) {
      if (patches.contains(patch.name())) {
        turner.turn(patch);
      }
    }
    List<Copy> copies = turner.sources.values().stream().map(Copy::new).toList();
    return new Plan(mark + turner.edits.appliedTo(source.text()), copies, turner.refused);
  }

  /** By the meshes as the case has them: a part, scaled, welded. */
  private static Map<String, Against> against(Path file, Set<String> patches, int threads)
      throws IOException {
    Map<String, Against> against = new LinkedHashMap<>();
    if (!patches.isEmpty()) {
      ReadOptions options = new ReadOptions(file.toString(), Map.of(), List.of(), threads);
      for (Patch patch :
          CaseReader.read(file, options)
              .found()
              .orElseThrow(() -> new IOException(file + " has changed while it was read"))
              .patches()) {
        if (patches.contains(patch.name()) && patch.surface().isPresent()) {
          against.put(patch.name(), new Against(patch.surface().get()));
        }
      }
    }
    return against;
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
    YamlText text = name.get();
    if (text.start() < file.get().key().end()
        || file.get().key().start() < patch.key().start()
        || text.style() == YamlText.Style.BLOCK) {
      refused.put(patch.name(), "its mesh is an alias or a block of text; write `file` out");
      return;
    }
    Path original = folder.resolve(text.text()).normalize();
    Source source = sources.get(original);
    if (source == null) {
      TriangleMesh whole = read(original);
      Optional<String> unwritable =
          whole.parts().stream().filter(p -> !ObjWriter.isName(p)).findFirst();
      if (unwritable.isPresent()) {
        refused.put(patch.name(), "an OBJ file can't name a part `" + unwritable.get() + "`");
        return;
      }
      source = new Source(whole, new BitSet(), target(original));
      sources.put(original, source);
    }
    Optional<String> part =
        mesh.get().entry("part").flatMap(e -> e.value().asText()).map(YamlText::text);
    mark(source, part, against.get(patch.name()).triangles);
    int slash = Math.max(text.text().lastIndexOf('/'), text.text().lastIndexOf('\\'));
    String copy = text.text().substring(0, slash + 1) + source.target().getFileName();
    edits.replace(
        text.start(),
        text.end(),
        switch (text.style()) {
          case SINGLE_QUOTED -> "'" + copy.replace("'", "''") + "'";
          case DOUBLE_QUOTED -> '"' + copy.replace("\\", "\\\\").replace("\"", "\\\"") + '"';
          default -> copy;
        });
  }

  private TriangleMesh read(Path file) throws IOException {
    try {
      return MeshFile.read(file, threads).build(1);
    } catch (MeshFault fault) {
      throw new IOException(file + " has changed while it was read: " + fault.getMessage(), fault);
    }
  }

  /** Marks the triangles of a part, or of all, that are to be turned. */
  private static void mark(Source source, Optional<String> part, BitSet against) {
    TriangleMesh mesh = source.mesh();
    int index = part.map(p -> mesh.parts().indexOf(p)).orElse(-1);
    int k = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      if (part.isEmpty() || mesh.part(t) == index) {
        source.turned().set(t, against.get(k++));
      }
    }
  }

  /** Beside the original; another one for each, also where names differ only in their ending. */
  private Path target(Path original) {
    String name = String.valueOf(original.getFileName());
    int dot = name.indexOf('.', 1);
    String stem = (dot > 0 ? name.substring(0, dot) : name) + SUFFIX;
    Path target = original.resolveSibling(stem + ENDING);
    for (int k = 2; !targets.add(target); k++) {
      target = original.resolveSibling(stem + "-" + k + ENDING);
    }
    return target;
  }
}
