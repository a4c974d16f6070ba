package org.hullsum.casefile;

import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.CharBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import org.hullsum.problem.Place;
import org.hullsum.problem.ProblemKind;

/** Reads a file as UTF-8 text, or says why it is none. */
final class FileTextReader {
  /** No case file is as large; large tables belong in CSV files. */
  static final int MOST_BYTES = 8 << 20;

  /** Characters of a line: far more than a person writes, and few enough to be read at once. */
  private static final int LONGEST_LINE = 200_000;

  private static final char BYTE_ORDER_MARK = '\uFEFF';

  /** The text of a file, with the digest of its bytes. */
  record Content(SourceText source, FileDigest digest) {}

  private FileTextReader() {}

  static Optional<Content> read(Path file, String name, ProblemAccumulator problems) {
    Place whole = Place.wholeFile(name);
    if (!Files.exists(file)) {
      problems.add(ProblemKind.FILE_UNREADABLE, whole, "there is no such file");
      return Optional.empty();
    }
    if (Files.isDirectory(file)) {
      problems.add(
          ProblemKind.FILE_UNREADABLE, whole, "this is a folder; name the case file inside it");
      return Optional.empty();
    }
    byte[] bytes;
    try (InputStream in = Files.newInputStream(file)) {
      bytes = in.readNBytes(MOST_BYTES + 1);
    } catch (IOException e) {
      problems.add(
          ProblemKind.FILE_UNREADABLE, whole, "the file can't be read: " + reason(e, file));
      return Optional.empty();
    }
    if (bytes.length > MOST_BYTES) {
      problems.add(
          ProblemKind.LIMIT_EXCEEDED,
          whole,
          "the file is larger than "
              + (MOST_BYTES >> 20)
              + " MB; large tables belong in CSV files");
      return Optional.empty();
    }
    FileDigest digest = FileDigest.of(bytes);
    return decode(bytes, name, problems)
        .map(text -> new Content(new SourceText(name, text), digest));
  }

  private static String reason(IOException e, Path file) {
    return Files.isReadable(file)
        ? e.getClass().getSimpleName()
        : "permission to read it is missing";
  }

  private static Optional<String> decode(byte[] bytes, String name, ProblemAccumulator problems) {
    ByteBuffer in = ByteBuffer.wrap(bytes);
    CharBuffer out = CharBuffer.allocate(bytes.length);
    var decoder =
        StandardCharsets.UTF_8
            .newDecoder()
            .onMalformedInput(CodingErrorAction.REPORT)
            .onUnmappableCharacter(CodingErrorAction.REPORT);
    boolean whole;
    try {
      var result = decoder.decode(in, out, true);
      whole = !result.isError();
      if (result.isError()) {
        result.throwException();
      }
    } catch (CharacterCodingException e) {
      whole = false;
    }
    String text = out.flip().toString();
    SourceText source = new SourceText(name, text);
    int control = whole ? controlCharacter(text) : -1;
    if (!whole || control >= 0) {
      problems.add(
          ProblemKind.NOT_TEXT,
          source.place(whole ? control : text.length()),
          whole
              ? String.format(
                  "the character U+%04X has no place in a text file; is this a case file?",
                  (int) text.charAt(control))
              : "this is not UTF-8 text; save the file as UTF-8");
      return Optional.empty();
    }
    String body = !text.isEmpty() && text.charAt(0) == BYTE_ORDER_MARK ? text.substring(1) : text;
    if (tooLongALine(new SourceText(name, body), problems)) {
      return Optional.empty();
    }
    if (body.isBlank()) {
      problems.add(
          ProblemKind.NOT_TEXT,
          Place.wholeFile(name),
          "the file is empty; a case begins with `format: hullsum-case/1`");
      return Optional.empty();
    }
    return Optional.of(body);
  }

  private static boolean tooLongALine(SourceText source, ProblemAccumulator problems) {
    for (int line = 0; line < source.lineCount(); line++) {
      int length = source.lineLength(line);
      if (length > LONGEST_LINE) {
        problems.add(
            ProblemKind.LIMIT_EXCEEDED,
            source.place(source.indexOf(line, 0)),
            "this line has "
                + length
                + " characters; no line of a case has more than "
                + LONGEST_LINE);
        return true;
      }
    }
    return false;
  }

  private static int controlCharacter(String text) {
    for (int i = 0; i < text.length(); i++) {
      char c = text.charAt(i);
      if (Character.isISOControl(c) && c != '\n' && c != '\r' && c != '\t' && c != '\u0085') {
        return i;
      }
    }
    return -1;
  }
}
