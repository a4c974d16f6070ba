package org.hullsum.audit;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.model.Waiver;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;

/**
 * Applies the waivers of a case to its findings.
 *
 * <p>A waiver holds through its last day. One that no finding needs is a note; one that has expired
 * and would be needed is a warning, and waives nothing. Verdicts are not findings.
 */
final class Waivers {
  private Waivers() {}

  static List<Finding> apply(List<Finding> findings, List<Waiver> waivers, LocalDate today) {
    List<Finding> result = new ArrayList<>(findings);
    List<Finding> said = new ArrayList<>();
    for (Waiver waiver : waivers) {
      boolean expired = waiver.until().filter(until -> today.isAfter(until)).isPresent();
      boolean needed = false;
      for (int i = 0; i < result.size(); i++) {
        Finding finding = result.get(i);
        if (finding.code() == waiver.code()
            && finding.on().filter(waiver.where()::equals).isPresent()) {
          needed = true;
          if (!expired && finding.waived().isEmpty()) {
            result.set(i, finding.waivedBecause(reason(waiver)));
          }
        }
      }
      if (!needed) {
        said.add(unused(waiver));
      } else if (expired) {
        said.add(expired(waiver));
      }
    }
    result.addAll(said);
    return List.copyOf(result);
  }

  private static String reason(Waiver waiver) {
    return waiver.by().isBlank() ? waiver.because() : waiver.because() + " (" + waiver.by() + ")";
  }

  private static Finding unused(Waiver waiver) {
    return Finding.of(
        FindingCode.WAIVER_UNUSED,
        "no finding `"
            + waiver.code().code()
            + "` on `"
            + waiver.where()
            + "` was made, so this waiver waives nothing",
        waiver.where(),
        Optional.of(waiver.place()),
        Map.of("finding", waiver.code().code()));
  }

  private static Finding expired(Waiver waiver) {
    return Finding.of(
        FindingCode.WAIVER_EXPIRED,
        "the waiver of `"
            + waiver.code().code()
            + "` on `"
            + waiver.where()
            + "` held until "
            + waiver.until().orElseThrow()
            + " and waives nothing now",
        waiver.where(),
        Optional.of(waiver.place()),
        Map.of("finding", waiver.code().code()));
  }
}
