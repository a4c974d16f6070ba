package org.hullsum.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.time.LocalDate;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.model.Waiver;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;
import org.hullsum.problem.Place;
import org.junit.jupiter.api.Test;

class WaiversTest {
  private static final LocalDate LAST_DAY = LocalDate.of(2030, 6, 30);
  private static final Place PLACE = new Place("case.yaml", 3, 5);

  private static final Finding MISSED =
      Finding.of(FindingCode.CLAIM_MISSED, "missed", "inlet", Optional.empty(), Map.of());

  private static Waiver waiver(FindingCode code, String where) {
    return new Waiver(code, where, "old data sheet", "R. Quill", Optional.of(LAST_DAY), PLACE);
  }

  @Test
  void findingIsWaivedThroughTheLastDay() {
    List<Finding> findings =
        Waivers.apply(
            List.of(MISSED), List.of(waiver(FindingCode.CLAIM_MISSED, "inlet")), LAST_DAY);
    assertEquals(1, findings.size());
    assertEquals(Optional.of("old data sheet (R. Quill)"), findings.get(0).waived());
  }

  @Test
  void expiredWaiverWaivesNothingAndIsWarnedOf() {
    List<Finding> findings =
        Waivers.apply(
            List.of(MISSED),
            List.of(waiver(FindingCode.CLAIM_MISSED, "inlet")),
            LAST_DAY.plusDays(1));
    assertTrue(findings.get(0).waived().isEmpty());
    assertEquals(FindingCode.WAIVER_EXPIRED, findings.get(1).code());
    assertEquals(Optional.of(PLACE), findings.get(1).place());
  }

  @Test
  void waiverOfAnotherPatchOrCodeIsUnused() {
    List<Finding> findings =
        Waivers.apply(
            List.of(MISSED),
            List.of(
                waiver(FindingCode.CLAIM_MISSED, "outlet"),
                waiver(FindingCode.SURFACE_OPEN, "inlet")),
            LAST_DAY);
    assertTrue(findings.get(0).waived().isEmpty());
    assertEquals(FindingCode.WAIVER_UNUSED, findings.get(1).code());
    assertEquals(FindingCode.WAIVER_UNUSED, findings.get(2).code());
  }
}
