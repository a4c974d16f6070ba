package org.hullsum.casefile;

import java.util.Arrays;
import java.util.Collections;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;

/**
 * The kinds of mappings of a case file with the keys of each: those that this version reads, and
 * those of the format that it refuses for now.
 */
enum Section {
  CASE(
      "a case",
      "format title about quantity units uncertainties parameters fields volumes patches envelopes"
          + " tolerances time waivers",
      "quantities network"),
  CONSERVED("`quantity`", "name unit", ""),
  WORKING_UNITS("`units`", "length time mass temperature", ""),
  FIELD("a field", "vector unit coordinates axis gradient sum carrier content", ""),
  AXIS("`axis`", "through along", ""),
  GRADIENT("`gradient`", "of times", ""),
  VOLUME("a volume", "interior tolerances label", ""),
  INTERIOR("`interior`", "divergence-of generation accumulation", "quantity"),
  PER_VOLUME("a term per volume", "per-volume unit", "level holdup file"),
  ENVELOPE("an envelope", "of tolerances label", ""),
  PATCH("a patch", "leaves enters surface facing flux claim label about", ""),
  FACING("`facing`", "along away-from", ""),
  FLUX(
      "`flux`",
      "field flux-density unit metered fixed correlated-with profile traverse none unknown times"
          + " within",
      "facet-values carried-by content quantity"),
  METERED("`metered`", "", "totaliser over file column time unit uncertainty between"),
  PROFILE("`profile`", "power-law laminar uniform log-law centreline mean centre radius", ""),
  LOG_LAW("`log-law`", "roughness", ""),
  TRAVERSE(
      "`traverse`",
      "rule readings speed yaw pitch components pressure at uncertainty rule-uncertainty centre"
          + " radius",
      ""),
  TRAVERSE_PRESSURE("`pressure`", "column density coefficient", ""),
  TRAVERSE_AT("`at`", "radius angle across up", ""),
  CLAIM("`claim`", "field", "quantity file"),
  TOLERANCES("`tolerances`", "absolute relative coverage", "quantity"),
  TIME("`time`", "from to steps", ""),
  WAIVER("a waiver", "finding where because by until", ""),
  SURFACE(
      "`surface`",
      "polygon rectangle disk cylinder cone sphere ellipsoid torus graph parametric revolution mesh"
          + " placed trim",
      ""),
  MESH("`mesh`", "file part unit scale weld", ""),
  POLYGON("`polygon`", "points", ""),
  RECTANGLE("`rectangle`", "corner edges", ""),
  DISK("`disk`", "centre normal radius hole sector zero", ""),
  CYLINDER("`cylinder`", "from to radius sector zero", ""),
  CONE("`cone`", "from to radii sector zero", ""),
  SPHERE("`sphere`", "centre radius axis polar azimuth zero", ""),
  ELLIPSOID("`ellipsoid`", "centre semi-axes polar azimuth", ""),
  TORUS("`torus`", "centre axis ring-radius tube-radius azimuth tube zero", ""),
  GRAPH("`graph`", "x y z over", ""),
  GRAPH_RANGE("`over`", "x y z disk polygon", ""),
  GRAPH_DISK("`disk` of `over`", "centre radius", ""),
  PARAMETRIC("`parametric`", "point u v", ""),
  REVOLUTION("`revolution`", "profile axis sector zero", ""),
  REVOLUTION_PROFILE("`profile` of `revolution`", "radius height s", ""),
  PLACED("`placed`", "turn move", ""),
  TURN("`turn`", "about angle", ""),
  TRIM("`trim`", "inside outside", ""),
  BODY("a body of `trim`", "cylinder cone sphere ellipsoid box half-space where", ""),
  BODY_CYLINDER("the body `cylinder`", "from to radius", ""),
  BODY_CONE("the body `cone`", "from to radii", ""),
  BODY_SPHERE("the body `sphere`", "centre radius", ""),
  BODY_ELLIPSOID("the body `ellipsoid`", "centre semi-axes", ""),
  BOX("the body `box`", "corner edges", ""),
  HALF_SPACE("the body `half-space`", "through normal", "");

  private final String title;
  private final String keys;
  private final String notYet;

  Section(String title, String keys, String notYet) {
    this.title = title;
    this.keys = keys;
    this.notYet = notYet;
  }

  private static Set<String> words(String text) {
    return Collections.unmodifiableSet(
        text.isEmpty() ? Set.of() : new LinkedHashSet<>(List.of(text.split(" "))));
  }

  /** What it is, for messages, such as {@code a patch}. */
  String title() {
    return title;
  }

  /** The keys that this version reads, in the order of the format's page. */
  Set<String> keys() {
    return words(keys);
  }

  /** The keys of the format that this version refuses for now. */
  Set<String> notYet() {
    return words(notYet);
  }

  /** Where a key that is unknown here belongs, if it is a key at all. */
  static Optional<Section> owning(String key) {
    return Arrays.stream(values())
        .filter(s -> s.keys().contains(key) || s.notYet().contains(key))
        .findFirst();
  }

  static Set<String> allKeys() {
    return Arrays.stream(values()).flatMap(s -> s.keys().stream()).collect(Collectors.toSet());
  }

  /** What to write instead of a key that is not read yet; empty where there is nothing. */
  String wayRound(String key) {
    return key.equals("level")
        ? "; write the rate itself, such as `accumulation: area*(level2 - level1)/period` with these"
            + " as parameters"
        : "";
  }
}
