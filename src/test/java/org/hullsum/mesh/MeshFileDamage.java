package org.hullsum.mesh;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.Stream;
import java.util.zip.GZIPOutputStream;

/**
 * Damages sound files at random and has them read: a file must be read or be refused with a place.
 * Run as a program for as long as wanted: {@code FOLDER SECONDS SEED [ENDING…]}.
 */
final class MeshFileDamage {
  /** A file of some kilobytes that takes longer than this has not been bounded. */
  private static final Duration LONGEST = Duration.ofSeconds(5);

  private static final int LARGEST = 1 << 16;

  private static final String LETTERS = " \n\r\t/\\-+.#_<>&=\"0123456789eE";

  private static final List<String> NASTY =
      List.of(
          "0",
          "-1",
          "1",
          "3",
          "255",
          "65536",
          "2147483647",
          "2147483648",
          "-2147483648",
          "4294967295",
          "4294967296",
          "9223372036854775807",
          "99999999999999999999",
          "nan",
          "inf",
          "1e999",
          "-1e-999",
          "1e308",
          "4.9e-324",
          ".",
          "-",
          "",
          "0x10",
          "1 1",
          "\n",
          "\r",
          "\\\n");

  private static final long[] NUMBERS = {
    0,
    1,
    -1,
    2,
    3,
    127,
    255,
    256,
    65535,
    65536,
    Integer.MAX_VALUE,
    Integer.MIN_VALUE,
    1L << 32,
    Long.MAX_VALUE,
    Long.MIN_VALUE,
    Double.doubleToLongBits(Double.NaN),
    Double.doubleToLongBits(Double.MAX_VALUE),
    0x7f800000,
    0x7f7fffff
  };

  private final List<byte[]> sound;
  private final List<String> names;
  private final SplittableRandom random;
  private long read;
  private long refused;

  private MeshFileDamage(List<String> names, List<byte[]> sound, long seed) {
    this.names = names;
    this.sound = sound;
    this.random = new SplittableRandom(seed);
  }

  /** With the files of a folder whose names end in one of some ways. */
  static MeshFileDamage of(Path folder, long seed, List<String> endings) throws IOException {
    List<String> names = new ArrayList<>();
    List<byte[]> sound = new ArrayList<>();
    try (Stream<Path> files = Files.list(folder)) {
      for (Path file : files.sorted().toList()) {
        String name = String.valueOf(file.getFileName());
        if (endings.stream().anyMatch(name::endsWith)) {
          names.add(name);
          sound.add(Files.readAllBytes(file));
        }
      }
    }
    if (names.isEmpty()) {
      throw new IllegalArgumentException("no files " + endings + " in " + folder);
    }
    return new MeshFileDamage(names, sound, seed);
  }

  long read() {
    return read;
  }

  long refused() {
    return refused;
  }

  /** Reads one damaged file. */
  void once() throws IOException {
    int k = random.nextInt(sound.size());
    byte[] file = sound.get(k);
    for (int times = 1 + random.nextInt(1 + random.nextInt(5)); times > 0; times--) {
      file = damaged(file);
    }
    if (random.nextInt(8) == 0) {
      file = gzip(file);
      file = random.nextInt(4) == 0 ? damaged(file) : file;
    }
    long start = System.nanoTime();
    try {
      boolean sound = read(names.get(k), file);
      if (names.get(k).endsWith(".stl")) {
        readFromDisk(file, sound);
      }
    } catch (RuntimeException | Error fault) {
      Path kept = Files.createTempFile("damaged-", "-" + names.get(k));
      Files.write(kept, file);
      throw new AssertionError("kept in " + kept, fault);
    }
    long nanoseconds = System.nanoTime() - start;
    if (nanoseconds > LONGEST.toNanos()) {
      Path kept = Files.createTempFile("slow-", "-" + names.get(k));
      Files.write(kept, file);
      throw new AssertionError(Duration.ofNanos(nanoseconds) + " for what is kept in " + kept);
    }
  }

  /** Files on a disk may take another way; it must come to the same. */
  private static void readFromDisk(byte[] file, boolean expected) throws IOException {
    Path copy = Files.createTempFile("damaged-", ".stl");
    try {
      Files.write(copy, file);
      MeshFile.read(copy, 2).build(1);
      if (!expected) {
        throw new IllegalStateException("read from the disk, but not from a channel");
      }
    } catch (MeshFault fault) {
      if (expected) {
        throw new IllegalStateException("read from a channel, but not from the disk", fault);
      }
    } finally {
      Files.delete(copy);
    }
  }

  /** Whether it was read, not refused. */
  private boolean read(String name, byte[] file) throws IOException {
    try {
      MeshFile.read(RecordedTriangles.channel(file), file.length, name, new CheckingSink());
      read++;
      return true;
    } catch (MeshFault fault) {
      refused++;
      if (fault.offset().isEmpty() == fault.line().isEmpty() || fault.getMessage().isEmpty()) {
        throw new IllegalStateException("a fault without one place and message", fault);
      }
      return false;
    }
  }

  private static byte[] gzip(byte[] content) throws IOException {
    ByteArrayOutputStream packed = new ByteArrayOutputStream();
    try (GZIPOutputStream stream = new GZIPOutputStream(packed)) {
      stream.write(content);
    }
    return packed.toByteArray();
  }

  private byte[] damaged(byte[] file) {
    if (file.length == 0) {
      return new byte[] {(byte) random.nextInt()};
    }
    int at = random.nextInt(file.length);
    int length = Math.min(file.length - at, 1 + random.nextInt(1 << random.nextInt(10)));
    return switch (random.nextInt(11)) {
      case 0 -> changed(file, at, (byte) (file[at] ^ 1 << random.nextInt(8)));
      case 1 -> changed(file, at, (byte) random.nextInt());
      case 2 -> changed(file, at, (byte) LETTERS.charAt(random.nextInt(LETTERS.length())));
      case 3 -> spliced(file, at, length, new byte[0]);
      case 4 -> spliced(file, at, 0, Arrays.copyOfRange(file, at, at + length));
      case 5 -> Arrays.copyOf(file, at);
      case 6 -> spliced(file, at, 0, foreign());
      case 7 -> spliced(file, at, random.nextInt(2) * length, randomBytes(length));
      case 8 -> withNumber(file, at);
      default -> withNastyWord(file, at);
    };
  }

  private static byte[] changed(byte[] file, int at, byte value) {
    byte[] copy = file.clone();
    copy[at] = value;
    return copy;
  }

  private static byte[] spliced(byte[] file, int at, int without, byte[] with) {
    byte[] copy = Arrays.copyOf(file, file.length - without + with.length);
    System.arraycopy(with, 0, copy, at, with.length);
    System.arraycopy(file, at + without, copy, at + with.length, file.length - at - without);
    return copy.length > LARGEST ? Arrays.copyOf(copy, LARGEST) : copy;
  }

  private byte[] foreign() {
    byte[] other = sound.get(random.nextInt(sound.size()));
    int from = random.nextInt(other.length);
    return Arrays.copyOfRange(
        other, from, from + Math.min(other.length - from, 1 + random.nextInt(400)));
  }

  private byte[] randomBytes(int length) {
    byte[] bytes = new byte[length];
    random.nextBytes(bytes);
    return bytes;
  }

  private byte[] withNumber(byte[] file, int at) {
    byte[] copy = file.clone();
    long number = NUMBERS[random.nextInt(NUMBERS.length)];
    int size = 1 << random.nextInt(4);
    boolean big = random.nextBoolean();
    for (int k = 0; k < size && at + k < copy.length; k++) {
      copy[at + k] = (byte) (number >> 8 * (big ? size - 1 - k : k));
    }
    return copy;
  }

  /** Puts a nasty number in place of the word at an index. */
  private byte[] withNastyWord(byte[] file, int at) {
    int from = at;
    while (from > 0 && isWord(file[from - 1])) {
      from--;
    }
    int to = at;
    while (to < file.length && isWord(file[to])) {
      to++;
    }
    String word = NASTY.get(random.nextInt(NASTY.size()));
    return spliced(file, from, to - from, word.getBytes(StandardCharsets.US_ASCII));
  }

  private static boolean isWord(byte letter) {
    return letter > ' ' && letter != '"' && letter != '<' && letter != '>' && letter != '/';
  }

  /** Holds readers to what they owe the sink. */
  private static final class CheckingSink implements TriangleSink {
    private int vertices;

    @Override
    public void part(String name) {
      if (name.length() > 4 * TextCursor.LONGEST_LINE) {
        throw new IllegalStateException("a name of " + name.length() + " letters");
      }
    }

    @Override
    public int vertex(double x, double y, double z) {
      if (!Double.isFinite(x) || !Double.isFinite(y) || !Double.isFinite(z)) {
        throw new IllegalStateException("a point that is not finite");
      }
      return vertices++;
    }

    @Override
    public void triangle(int a, int b, int c) {
      if (Math.min(a, Math.min(b, c)) < 0 || Math.max(a, Math.max(b, c)) >= vertices) {
        throw new IllegalStateException("corners " + a + ", " + b + ", " + c);
      }
    }
  }

  /** Damages files of one ending after the other, and says what came of it. */
  public static void main(String[] arguments) throws IOException {
    Path folder = Path.of(arguments[0]);
    long seconds = Long.parseLong(arguments[1]);
    long seed = Long.parseLong(arguments[2]);
    for (String ending : Arrays.asList(arguments).subList(3, arguments.length)) {
      MeshFileDamage damage = of(folder, seed, List.of(ending.split("\\+")));
      long end = System.nanoTime() + Duration.ofSeconds(seconds).toNanos();
      long faults = 0;
      while (System.nanoTime() < end) {
        try {
          damage.once();
        } catch (AssertionError fault) {
          faults++;
          System.err.println(ending + ": " + fault.getMessage() + ": " + fault.getCause());
        }
      }
      System.err.printf(
          "%s: %d read, %d refused, %d faults%n", ending, damage.read(), damage.refused(), faults);
    }
  }
}
