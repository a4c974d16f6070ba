package org.hullsum.casefile;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/** Stretches of a text that others take the place of; all else stays as it is. */
final class TextEdits {
  private final List<Edit> edits = new ArrayList<>();

  private record Edit(int from, int to, String text) {}

  void replace(int from, int to, String text) {
    edits.add(new Edit(from, to, text));
  }

  String appliedTo(String original) {
    StringBuilder text = new StringBuilder();
    int at = 0;
    edits.sort(Comparator.comparingInt(Edit::from));
    for (Edit edit : edits) {
      text.append(original, at, edit.from()).append(edit.text());
      at = edit.to();
    }
    return text.append(original.substring(at)).toString();
  }
}
