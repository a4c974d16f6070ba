import java.io.BufferedInputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.net.URL;
import java.net.URLClassLoader;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.time.Instant;
import java.time.LocalDateTime;
import java.time.ZoneOffset;
import java.util.Comparator;
import java.util.Map;
import java.util.TreeMap;
import java.util.zip.ZipEntry;
import java.util.zip.ZipInputStream;
import java.util.zip.ZipOutputStream;
import org.objectweb.asm.ClassReader;
import org.objectweb.asm.ClassVisitor;
import org.objectweb.asm.ClassWriter;
import org.objectweb.asm.Opcodes;

/**
 * Finishes the program's jar so that two builds give the same bytes and a start is quick.
 *
 * <p>Entries are sorted by name behind the manifest and carry one time. Class files older than Java
 * 7 are raised to the version of Java 8, stack maps included: class-data sharing passes over those
 * older than Java 6, the command-line library has such, and with them in the archive a start takes
 * about 60 ms less.
 *
 * <p>Run by the build: {@code java -cp ASM FinishJar.java JAR INSTANT}.
 */
public final class FinishJar {
  /** Class files from this version on carry stack maps and are left alone. */
  private static final int FIRST_WITH_STACK_MAPS = Opcodes.V1_7;

  private static final String MANIFEST = "META-INF/MANIFEST.MF";

  private FinishJar() {}

  /** Rewrites the jar that the first argument names, with the time of the second. */
  public static void main(String[] arguments) throws IOException {
    Path jar = Path.of(arguments[0]);
    LocalDateTime time = LocalDateTime.ofInstant(Instant.parse(arguments[1]), ZoneOffset.UTC);
    Path finished = jar.resolveSibling(jar.getFileName() + ".part");
    try (URLClassLoader classes = new URLClassLoader(new URL[] {jar.toUri().toURL()});
        OutputStream file = Files.newOutputStream(finished);
        ZipOutputStream out = new ZipOutputStream(file)) {
      for (Map.Entry<String, byte[]> entry : entries(jar).entrySet()) {
        ZipEntry copy = new ZipEntry(entry.getKey());
        copy.setTimeLocal(time);
        out.putNextEntry(copy);
        boolean isClass = entry.getKey().endsWith(".class");
        out.write(isClass ? raised(entry.getValue(), classes) : entry.getValue());
        out.closeEntry();
      }
    }
    Files.move(finished, jar, StandardCopyOption.REPLACE_EXISTING);
  }

  private static Map<String, byte[]> entries(Path jar) throws IOException {
    Map<String, byte[]> entries =
        new TreeMap<>(
            Comparator.comparing((String name) -> !name.equals(MANIFEST))
                .thenComparing(Comparator.naturalOrder()));
    try (ZipInputStream in =
        new ZipInputStream(new BufferedInputStream(Files.newInputStream(jar)))) {
      for (ZipEntry entry = in.getNextEntry(); entry != null; entry = in.getNextEntry()) {
        if (!entry.isDirectory()) {
          entries.put(entry.getName(), in.readAllBytes());
        }
      }
    }
    return entries;
  }

  private static byte[] raised(byte[] bytes, ClassLoader classes) {
    int version = (bytes[6] & 0xFF) << 8 | bytes[7] & 0xFF;
    if (version >= FIRST_WITH_STACK_MAPS) {
      return bytes;
    }
    ClassWriter writer =
        new ClassWriter(ClassWriter.COMPUTE_FRAMES) {
          @Override
          protected ClassLoader getClassLoader() {
            return classes;
          }
        };
    new ClassReader(bytes)
        .accept(
            new ClassVisitor(Opcodes.ASM9, writer) {
              @Override
              public void visit(
                  int old, int access, String name, String signature, String up, String[] all) {
                super.visit(Opcodes.V1_8, access, name, signature, up, all);
              }
            },
            ClassReader.SKIP_FRAMES);
    return writer.toByteArray();
  }
}
