package org.hullsum.casefile;

import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.hullsum.problem.ProblemKind;

/**
 * What YAML makes of a text that its writer meant otherwise: a key without a blank after its colon,
 * a comma that ends an item, a comment that cuts a text short, a line that runs on into the next.
 */
final class YamlTraps {
  private static final Set<String> KEYS = new TreeSet<>(Section.allKeys());
  private static final Pattern KEY_WITHOUT_BLANK =
      Pattern.compile("(?:^|\\s)([A-Za-z][A-Za-z-]*):(?=[^\\s])");

  private YamlTraps() {}

  /** A hint to append to a problem of this text, or nothing. */
  static String hint(YamlText text) {
    if (!text.plain()) {
      return "";
    }
    Matcher glued = KEY_WITHOUT_BLANK.matcher(text.text());
    while (glued.find()) {
      if (KEYS.contains(glued.group(1))) {
        return "; a blank is missing after `" + glued.group(1) + ":`";
      }
    }
    if (text.manyLines()) {
      return "; YAML joins the lines up to line "
          + (text.source().lineAt(Math.max(text.start(), text.end() - 1)) + 1)
          + " to one text";
    }
    if (text.inFlow() && unbalanced(text.text())) {
      return "; inside [ ] or { } a comma ends the text: put it in quotes";
    }
    return "";
  }

  /** Whether brackets are opened and not closed, or the reverse, as where a comma cut a call. */
  static boolean unbalanced(String text) {
    int open = 0;
    for (int i = 0; i < text.length(); i++) {
      switch (text.charAt(i)) {
        case '(' -> open++;
        case ')' -> open--;
        default -> {}
      }
      if (open < 0) {
        return true;
      }
    }
    return open != 0;
  }

  /** Warns of a free text that is probably not all of it, or more than was meant. */
  static void warn(YamlText text, ProblemAccumulator problems) {
    if (!text.plain()) {
      return;
    }
    warnOfComment(text, problems);
    Matcher glued = KEY_WITHOUT_BLANK.matcher(text.text());
    while (glued.find()) {
      if (KEYS.contains(glued.group(1))) {
        problems.add(
            ProblemKind.SUSPICIOUS,
            text.place(glued.start(1)),
            "is `"
                + glued.group(1)
                + ":` meant as a key? A blank is missing after its colon, so it became part of the"
                + " text before");
        return;
      }
    }
  }

  private static void warnOfComment(YamlText text, ProblemAccumulator problems) {
    SourceText source = text.source();
    int line = source.lineAt(Math.max(text.start(), text.end() - 1));
    int lineStart = source.indexOf(line, 0);
    String rest = source.line(line).substring(Math.max(0, text.end() - lineStart));
    int hash = rest.indexOf('#');
    if (hash < 0 || !rest.substring(0, hash).isBlank()) {
      return;
    }
    boolean oneBlank = hash == 1;
    boolean glued = hash + 1 < rest.length() && !Character.isWhitespace(rest.charAt(hash + 1));
    if (oneBlank || glued) {
      problems.add(
          ProblemKind.SUSPICIOUS,
          source.place(text.end() + hash),
          "the text ends before ` #`, where YAML begins a comment: quote the text if the rest"
              + " belongs to it");
    }
  }

  /** The known key with which a line begins, without a blank after its colon; else nothing. */
  static String gluedKey(String line) {
    Matcher matcher = KEY_WITHOUT_BLANK.matcher(line);
    while (matcher.find()) {
      if (KEYS.contains(matcher.group(1))) {
        return matcher.group(1);
      }
    }
    return "";
  }
}
