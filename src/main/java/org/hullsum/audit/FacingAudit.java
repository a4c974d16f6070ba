package org.hullsum.audit;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.hullsum.audit.PatchResult.FoundFacing;
import org.hullsum.closure.FoundFacing.Side;
import org.hullsum.closure.WindingOpinion;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;
import org.hullsum.problem.Severity;

/**
 * Compares each patch's normal as declared with what was found in the volumes on its two sides.
 *
 * <p>The normal is right where it points out of the volume that the patch leaves and into the one
 * that it enters. A shared patch is found twice, and independently; where the two agree that it is
 * wrong its facing is reversed, where they disagree {@code leaves} and {@code enters} can't both be
 * right.
 */
final class FacingAudit {
  private final Map<String, SurfaceAudit> surfaces = new LinkedHashMap<>();
  private final Map<String, WindingOpinion> opinions;
  private final Map<String, Seen> seen = new LinkedHashMap<>();

  /** The signs, against the construction normal, of patches that are to face as found. */
  private final Map<String, Integer> turned = new LinkedHashMap<>();

  /**
   * What is seen of one patch.
   *
   * @param found empty where nothing could be looked for
   * @param leaning the answer towards which an undetermined one leans
   * @param reason why it is undetermined, or on what it rests
   * @param conflict whether the two sides contradict each other
   * @param windingAlone whether nothing but winding numbers tells it
   */
  record Seen(
      Optional<FoundFacing> found,
      Optional<FoundFacing> leaning,
      Optional<String> reason,
      boolean conflict,
      boolean windingAlone) {
    static final Seen NOTHING =
        new Seen(Optional.empty(), Optional.empty(), Optional.empty(), false, false);

    /** Where lines or seams tell. */
    static Seen told(FoundFacing found) {
      return new Seen(Optional.of(found), Optional.empty(), Optional.empty(), false, false);
    }
  }

  /**
   * Looks at every patch.
   *
   * @param opinions of winding numbers, by the volume, where there are any
   */
  FacingAudit(
      List<PatchAudit> patches, List<SurfaceAudit> audited, Map<String, WindingOpinion> opinions) {
    this.opinions = opinions;
    audited.forEach(s -> surfaces.put(s.volume().name(), s));
    patches.forEach(p -> seen.put(p.name(), look(p)));
  }

  Seen of(String patch) {
    return seen.get(patch);
  }

  /** A patch that is to face outward, facing so; any other as it is. */
  PatchAudit resolved(PatchAudit patch) {
    if (!patch.facesAsFound() || patch.degenerate().isPresent()) {
      return patch;
    }
    Integer sign = turned.get(patch.name());
    return sign != null
        ? patch.facing(sign)
        : patch.withoutFacing(seen.get(patch.name()).reason().orElse("it bounds no volume"));
  }

  /** Patches found, or leaning, inward: for explanations. */
  Set<String> inward() {
    Set<String> names = new LinkedHashSet<>();
    seen.forEach(
        (name, s) -> {
          Optional<FoundFacing> side =
              s.found().filter(f -> f != FoundFacing.UNDETERMINED).or(s::leaning);
          if (side.filter(FoundFacing.INWARD::equals).isPresent() && !s.conflict()) {
            names.add(name);
          }
        });
    return names;
  }

  private Seen look(PatchAudit patch) {
    if (patch.surface().isEmpty() || patch.patch().isBaffle()) {
      return Seen.NOTHING;
    }
    Optional<org.hullsum.closure.FoundFacing> behind = in(patch.patch().leaves(), patch);
    Optional<org.hullsum.closure.FoundFacing> ahead = in(patch.patch().enters(), patch);
    if (patch.degenerate().isPresent()) {
      return undetermined(Optional.empty(), patch.degenerate().get());
    }
    if (behind.isEmpty() && ahead.isEmpty()) {
      return Seen.NOTHING;
    }
    if (behind.isPresent() && ahead.isPresent() && !behind.get().fits(ahead.get())) {
      return new Seen(
          Optional.of(FoundFacing.UNDETERMINED),
          Optional.empty(),
          Optional.of("the volumes on its two sides contradict each other"),
          true,
          false);
    }
    Optional<Side> side =
        behind
            .map(f -> f.side())
            .filter(s -> s != Side.UNDETERMINED)
            .or(() -> ahead.map(f -> f.side().opposite()).filter(s -> s != Side.UNDETERMINED));
    if (side.isPresent() && patch.facesAsFound()) {
      turned.put(patch.name(), side.get().sign());
      return Seen.told(FoundFacing.OUTWARD);
    }
    if (side.isPresent()) {
      return Seen.told(declared(side.get(), patch));
    }
    Optional<Side> leaning =
        behind
            .flatMap(f -> f.leaning())
            .or(() -> ahead.flatMap(f -> f.leaning().map(Side::opposite)));
    String reason =
        behind.or(() -> ahead).flatMap(f -> f.reason()).map(r -> r.words()).orElse("unknown");
    // Lines that lean the other way leave nothing clear.
    return byWinding(patch)
        .filter(s -> leaning.isEmpty() || leaning.get() == s)
        .map(s -> alone(s, patch, reason))
        .orElseGet(() -> undetermined(leaning.map(s -> declared(s, patch)), reason));
  }

  private Seen alone(Side side, PatchAudit patch, String reason) {
    if (patch.facesAsFound()) {
      turned.put(patch.name(), side.sign());
      return alone(FoundFacing.OUTWARD, reason);
    }
    return alone(declared(side, patch), reason);
  }

  private static Seen alone(FoundFacing facing, String reason) {
    return new Seen(
        Optional.of(facing),
        Optional.empty(),
        Optional.of("rests on winding numbers alone: " + reason),
        false,
        true);
  }

  private static Seen undetermined(Optional<FoundFacing> leaning, String reason) {
    return new Seen(
        Optional.of(FoundFacing.UNDETERMINED), leaning, Optional.of(reason), false, false);
  }

  /** The side, seen from the volume that is left; empty where the two volumes disagree. */
  private Optional<Side> byWinding(PatchAudit patch) {
    Optional<Side> behind = byWinding(patch.patch().leaves(), patch);
    Optional<Side> ahead = byWinding(patch.patch().enters(), patch).map(Side::opposite);
    boolean differ = behind.isPresent() && ahead.isPresent() && !behind.equals(ahead);
    return differ ? Optional.empty() : behind.or(() -> ahead);
  }

  private Optional<Side> byWinding(String volume, PatchAudit patch) {
    int place = surfaces.containsKey(volume) ? surfaces.get(volume).patches().indexOf(patch) : -1;
    return place < 0
        ? Optional.empty()
        : Optional.ofNullable(opinions.get(volume))
            .map(opinion -> opinion.votes().get(place).side())
            .filter(s -> s != Side.UNDETERMINED);
  }

  /** Patches of which nothing but winding numbers tells the facing. */
  Set<String> byWindingAlone() {
    Set<String> names = new LinkedHashSet<>();
    seen.forEach(
        (name, s) -> {
          if (s.windingAlone()) {
            names.add(name);
          }
        });
    return names;
  }

  private Optional<org.hullsum.closure.FoundFacing> in(String volume, PatchAudit patch) {
    return Optional.ofNullable(surfaces.get(volume)).flatMap(s -> s.facingOf(patch.name()));
  }

  private static FoundFacing declared(Side constructionNormal, PatchAudit patch) {
    return constructionNormal.sign() * patch.sign() > 0 ? FoundFacing.OUTWARD : FoundFacing.INWARD;
  }

  /**
   * {@code orientation-reversed} and {@code orientation-conflict}, in the order of the case, then
   * {@code second-opinion-differs}.
   */
  List<Finding> findings(List<PatchAudit> patches) {
    List<Finding> findings = new ArrayList<>();
    for (PatchAudit patch : patches) {
      Seen s = seen.get(patch.name());
      if (s.conflict()) {
        findings.add(conflict(patch));
      } else if (s.found().filter(FoundFacing.INWARD::equals).isPresent()) {
        findings.add(reversed(patch, s.windingAlone()));
      }
    }
    surfaces.values().forEach(s -> SecondOpinionFindings.of(s, opinions).ifPresent(findings::add));
    return findings;
  }

  private static Finding conflict(PatchAudit patch) {
    String leaves = patch.patch().leaves();
    String enters = patch.patch().enters();
    return Finding.of(
        FindingCode.ORIENTATION_CONFLICT,
        "`"
            + patch.name()
            + "` lies with the same side towards `"
            + leaves
            + "` and towards `"
            + enters
            + "`: it can't leave the one and enter the other",
        patch.name(),
        Optional.of(patch.patch().place()),
        Map.of());
  }

  private static Finding reversed(PatchAudit patch, boolean windingAlone) {
    boolean turns = patch.followsNormal();
    String leaves = patch.patch().leaves();
    boolean outside = Explainer.isOutside(leaves);
    String message =
        "the normal of `"
            + patch.name()
            + "` as declared (`"
            + patch.patch().facing().text()
            + "`) points "
            + (outside ? "out of" : "into")
            + " `"
            + (outside ? patch.patch().enters() : leaves)
            + "`, which the patch "
            + (outside ? "enters" : "leaves")
            + (!turns
                ? "; its flux does not follow the normal, so no figure changes"
                : patch.passesNothing()
                    ? "; nothing flows through it, so no figure changes"
                    : "; its flux is counted with the wrong sign")
            + (windingAlone
                ? ". This rests on winding numbers alone, since neither seams nor lines tell"
                : "");
    Map<String, Object> evidence = new LinkedHashMap<>();
    evidence.put("declared", patch.patch().facing().text());
    evidence.put("found", FoundFacing.INWARD.word());
    if (windingAlone) {
      evidence.put("by", "winding-numbers");
    }
    return Finding.of(
            FindingCode.ORIENTATION_REVERSED,
            message,
            patch.name(),
            Optional.of(patch.patch().facingPlace()),
            evidence)
        .weighing(turns && !windingAlone ? Severity.ERROR : Severity.WARNING);
  }
}
