package org.hullsum.audit;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.hullsum.closure.FoundFacing;
import org.hullsum.closure.FoundFacing.Side;
import org.hullsum.closure.WindingOpinion;
import org.hullsum.closure.WindingOpinion.Numbers;
import org.hullsum.closure.WindingOpinion.Vote;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;

/** {@code second-opinion-differs}: winding numbers against what seams and lines found. */
final class SecondOpinionFindings {
  /** Patches that a message names. */
  private static final int MOST_NAMED = 3;

  private final SurfaceAudit surface;
  private final List<Numbers> misfits = new ArrayList<>();
  private final List<String> turned = new ArrayList<>();
  private final Map<String, Object> evidence = new LinkedHashMap<>();

  private SecondOpinionFindings(SurfaceAudit surface, WindingOpinion opinion) {
    this.surface = surface;
    if (!surface.open() && surface.bare().isEmpty()) {
      // Beside a gap the numbers are not whole however the patches face.
      opinion.numbers().orElse(List.of()).stream().filter(n -> !n.fit()).forEach(misfits::add);
    }
    for (int k = 0; k < surface.patches().size(); k++) {
      FoundFacing facing = surface.facings().facings().get(k);
      Vote vote = opinion.votes().get(k);
      if (vote.side() != Side.UNDETERMINED && vote.side() == facing.side().opposite()) {
        turned.add(surface.patches().get(k).name());
      }
    }
  }

  /** The finding on a volume's surface; empty where nothing differs or was asked. */
  static Optional<Finding> of(SurfaceAudit surface, Map<String, WindingOpinion> opinions) {
    return Optional.ofNullable(opinions.get(surface.volume().name()))
        .map(opinion -> new SecondOpinionFindings(surface, opinion))
        .filter(found -> !found.misfits.isEmpty() || !found.turned.isEmpty())
        .map(SecondOpinionFindings::finding);
  }

  private Finding finding() {
    String message =
        "winding numbers disagree with the facings that seams and lines found in `"
            + surface.volume().name()
            + "`"
            + (misfits.isEmpty() ? "" : numbers())
            + (turned.isEmpty()
                ? ""
                : "; with " + named(turned) + " the other way round they would fit");
    if (!turned.isEmpty()) {
      evidence.put("turned", turned);
    }
    return Finding.of(
        FindingCode.SECOND_OPINION_DIFFERS,
        message,
        surface.volume().name(),
        Optional.of(surface.volume().place()),
        evidence);
  }

  private String numbers() {
    Numbers worst = misfits.get(0);
    for (Numbers numbers : misfits) {
      worst = distance(numbers) > distance(worst) ? numbers : worst;
    }
    List<String> patches = misfits.stream().map(n -> name(n.patch())).toList();
    evidence.put("patches", patches);
    evidence.put("worst", name(worst.patch()));
    evidence.put("inside", worst.inside());
    evidence.put("outside", worst.outside());
    evidence.put("error", worst.error());
    return ": beside `"
        + name(worst.patch())
        + "` the surface winds "
        + text(worst.inside())
        + " times round a point inside and "
        + text(worst.outside())
        + " times round one outside, where 1 and 0 belong"
        + (patches.size() > 1 ? " (and not as it should beside " + named(others(worst)) + ")" : "");
  }

  private List<String> others(Numbers worst) {
    return misfits.stream().filter(n -> !n.equals(worst)).map(n -> name(n.patch())).toList();
  }

  private static double distance(Numbers numbers) {
    return Math.max(Math.abs(numbers.inside() - 1), Math.abs(numbers.outside()));
  }

  private String name(int patch) {
    return surface.patches().get(patch).name();
  }

  private static String text(double number) {
    // Adding zero makes −0 into 0.
    return String.format(Locale.ROOT, "%.2f", Math.rint(100 * number) / 100 + 0.0);
  }

  private static String named(List<String> names) {
    String first =
        "`" + String.join("`, `", names.subList(0, Math.min(MOST_NAMED, names.size()))) + "`";
    int more = names.size() - MOST_NAMED;
    return more > 0 ? first + " and " + more + " more" : first;
  }
}
