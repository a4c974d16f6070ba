package org.hullsum.audit;

import java.util.LinkedHashMap;
import java.util.Map;

/** Writes case files of the box from the origin to (2, 3, 1), plain numbers, changed in parts. */
final class BoxCase {
  private final Map<String, String> surfaces = new LinkedHashMap<>();
  private final Map<String, String> patches = new LinkedHashMap<>();
  private String flux = "{field: flow}";
  private String field = "[\"x/3\", \"y/3\", \"z/3\"]";
  private String interior = "{divergence-of: flow}";
  private String tail = "";

  BoxCase() {
    surfaces.put("left", "{rectangle: {corner: [0, 0, 0], edges: [[0, 0, 1], [0, 3, 0]]}}");
    surfaces.put("right", "{rectangle: {corner: [2, 0, 0], edges: [[0, 3, 0], [0, 0, 1]]}}");
    surfaces.put("front", "{rectangle: {corner: [0, 0, 0], edges: [[2, 0, 0], [0, 0, 1]]}}");
    surfaces.put("back", "{rectangle: {corner: [0, 3, 0], edges: [[0, 0, 1], [2, 0, 0]]}}");
    surfaces.put("floor", "{rectangle: {corner: [0, 0, 0], edges: [[0, 3, 0], [2, 0, 0]]}}");
    surfaces.put("lid", "{rectangle: {corner: [0, 0, 1], edges: [[2, 0, 0], [0, 3, 0]]}}");
    surfaces.keySet().forEach(name -> patches.put(name, ""));
  }

  BoxCase field(String x, String y, String z) {
    field = "[\"" + x + "\", \"" + y + "\", \"" + z + "\"]";
    return this;
  }

  /** The interior as it stands in the file; empty for the conservation check. */
  BoxCase interior(String text) {
    interior = text;
    return this;
  }

  /** The flux of every patch that has none of its own. */
  BoxCase flux(String text) {
    flux = text;
    return this;
  }

  /** More lines of one patch, indented by four. */
  BoxCase patch(String name, String lines) {
    patches.put(name, lines);
    return this;
  }

  BoxCase surface(String name, String text) {
    surfaces.put(name, text);
    patches.putIfAbsent(name, "");
    return this;
  }

  BoxCase without(String name) {
    patches.remove(name);
    return this;
  }

  /** More lines at the top level. */
  BoxCase also(String lines) {
    tail += lines;
    return this;
  }

  String yaml() {
    StringBuilder text = new StringBuilder();
    text.append("format: hullsum-case/1\nunits: none\n")
        .append("fields:\n  flow:\n    vector: ")
        .append(field)
        .append("\nvolumes:\n  box: {")
        .append(interior.isEmpty() ? "" : "interior: " + interior)
        .append("}\npatches:\n");
    patches.forEach(
        (name, lines) -> {
          text.append("  ").append(name).append(":\n");
          if (!lines.contains("leaves:") && !lines.contains("enters:")) {
            text.append("    leaves: box\n");
          }
          if (surfaces.containsKey(name)) {
            text.append("    surface: ").append(surfaces.get(name)).append('\n');
          }
          if (!lines.contains("flux:")) {
            text.append("    flux: ").append(flux).append('\n');
          }
          text.append(lines);
        });
    return text.append(tail).toString();
  }

  CaseResult audit() {
    return Audits.audit(yaml());
  }
}
