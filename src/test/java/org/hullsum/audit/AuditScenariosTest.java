package org.hullsum.audit;

import static org.hullsum.audit.Audits.audit;
import static org.hullsum.audit.Audits.balance;
import static org.hullsum.audit.Audits.finding;
import static org.hullsum.audit.Audits.only;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Optional;
import org.hullsum.audit.Explanation.Kind;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;
import org.hullsum.problem.Severity;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class AuditScenariosTest {
  private static final String HOLE =
      "      trim: {outside: [{cylinder: {from: [FROM], to: [TO], radius: 0.2}}]}\n";

  private static String sphere(String centre, String interior) {
    return """
        format: hullsum-case/1
        units: none
        fields:
          point:
            vector: ["x/(x^2+y^2+z^2)^1.5", "y/(x^2+y^2+z^2)^1.5", "z/(x^2+y^2+z^2)^1.5"]
        volumes:
          ball: {INTERIOR}
        patches:
          skin:
            leaves: ball
            surface: {sphere: {centre: [CENTRE], radius: 1}}
            flux: {field: point}
        """
        .replace("CENTRE", centre)
        .replace("INTERIOR", interior);
  }

  @Test
  void sourcePointInsideIsSingularAndTheIdentityIsUndecided() {
    CaseResult result = audit(sphere("0.2, 0.1, 0.3", "interior: {divergence-of: point}"));
    assertEquals(Verdict.UNDECIDED, only(result).verdict());
    assertTrue(only(result).residual().isEmpty());
    assertEquals(4 * Math.PI, only(result).outward().orElseThrow(), 1e-7);
    assertTrue(finding(result, FindingCode.FIELD_SINGULAR, "ball").isPresent());
  }

  @Test
  void sourcePointInsideIsAnImbalanceOfFourPi() {
    CaseResult result = audit(sphere("0.2, 0.1, 0.3", ""));
    assertEquals(Verdict.IMBALANCED, only(result).verdict());
    assertEquals(4 * Math.PI, only(result).residual().orElseThrow(), 1e-7);
    assertTrue(finding(result, FindingCode.FIELD_SINGULAR, "ball").isPresent());
  }

  @ParameterizedTest
  @ValueSource(strings = {"interior: {divergence-of: point}", ""})
  void sourcePointOutsideIsNothing(String interior) {
    CaseResult result = audit(sphere("1.5, 0.5, 0", interior));
    assertEquals(Verdict.BALANCED, only(result).verdict(), only(result).reason());
    assertTrue(finding(result, FindingCode.FIELD_SINGULAR, "ball").isEmpty());
  }

  @Test
  void fieldSingularOnAPatchIsUndecided() {
    CaseResult result = new BoxCase().field("1/(x - y/3)", "0", "0").interior("").audit();
    assertEquals(Verdict.UNDECIDED, only(result).verdict());
    assertTrue(only(result).residual().isEmpty());
    assertTrue(result.findings().stream().anyMatch(f -> f.code() == FindingCode.FIELD_SINGULAR));
  }

  @Test
  void cubeWithSixCentredHolesIsOpenWithSixRims() {
    Vector3[] middles = {
      new Vector3(0, 0.5, 0.5), new Vector3(1, 0.5, 0.5), new Vector3(0.5, 0, 0.5),
      new Vector3(0.5, 1, 0.5), new Vector3(0.5, 0.5, 0), new Vector3(0.5, 0.5, 1)
    };
    Vector3[] axes = {Vector3.X, Vector3.Y, Vector3.Z};
    String[] corners = {"0, 0, 0", "1, 0, 0", "0, 0, 0", "0, 1, 0", "0, 0, 0", "0, 0, 1"};
    String[] edges = {
      "[0, 0, 1], [0, 1, 0]", "[0, 1, 0], [0, 0, 1]", "[1, 0, 0], [0, 0, 1]",
      "[0, 0, 1], [1, 0, 0]", "[0, 1, 0], [1, 0, 0]", "[1, 0, 0], [0, 1, 0]"
    };
    StringBuilder yaml =
        new StringBuilder(
            """
            format: hullsum-case/1
            units: none
            fields:
              flow:
                vector: ["x", "0", "0"]
            volumes:
              cube: {interior: {divergence-of: flow}}
            patches:
            """);
    for (int i = 0; i < 6; i++) {
      yaml.append("  face")
          .append(i)
          .append(":\n    leaves: cube\n    surface:\n")
          .append("      rectangle: {corner: [")
          .append(corners[i])
          .append("], edges: [")
          .append(edges[i])
          .append("]}\n")
          .append(
              HOLE.replace("FROM", text(middles[i].minus(axes[i / 2].times(0.1))))
                  .replace("TO", text(middles[i].plus(axes[i / 2].times(0.1)))))
          .append("    flux: {field: flow}\n");
    }
    CaseResult result = audit(yaml.toString());
    assertEquals(Optional.of(false), result.surfaces().get(0).closed());
    assertEquals(6, result.surfaces().get(0).gaps().size());
    assertEquals(Verdict.UNDECIDED, only(result).verdict());
    assertTrue(only(result).interior().isEmpty());
  }

  private static String text(Vector3 point) {
    return point.x() + ", " + point.y() + ", " + point.z();
  }

  @Test
  void identityOnAnOpenBoxIsUndecidedAndTheGapExplainsIt() {
    CaseResult result = new BoxCase().field("x", "0.5*y", "2*z").without("lid").audit();
    BalanceResult balance = only(result);
    assertEquals(Verdict.UNDECIDED, balance.verdict());
    assertTrue(balance.residual().isEmpty());
    assertEquals(Optional.of(false), result.surfaces().get(0).closed());
    assertTrue(finding(result, FindingCode.SURFACE_OPEN, "box").isPresent());
    Explanation first = result.explanations().get(0);
    assertEquals(Kind.GAP, first.kind());
    assertEquals(6, first.factor().orElseThrow(), 1e-9);
    assertTrue(first.fits());
    assertEquals(0, first.residualThen(), 1e-9);
    assertEquals(1, result.surfaces().get(0).gaps().get(0).centre().z(), 1e-9);
  }

  @Test
  void lidThatStandsTwiceIsAnOverlapCountedTwice() {
    CaseResult result =
        new BoxCase()
            .field("1", "0", "0.5")
            .interior("")
            .surface("again", "{rectangle: {corner: [0, 0, 1], edges: [[2, 0, 0], [0, 3, 0]]}}")
            .audit();
    assertTrue(finding(result, FindingCode.SURFACE_OVERLAP, "again").isPresent());
    Explanation first = result.explanations().get(0);
    assertEquals(Kind.COUNTED_TWICE, first.kind());
    assertEquals(0, first.residualThen(), 1e-9);
    assertTrue(List.of("lid", "again").contains(first.on().get(0)));
  }

  @Test
  void patchOnTheSameSideOfBothItsVolumesIsAConflict() {
    CaseResult result =
        audit(
            """
            format: hullsum-case/1
            units: none
            volumes: {long: {}, short: {}}
            patches:
            """
                + wall("shared", "long", "short", "0, 0, 0", "[0, 0, 1], [0, 1, 0]")
                + cuboid("long", 2)
                + cuboid("short", 1));
    assertTrue(finding(result, FindingCode.ORIENTATION_CONFLICT, "shared").isPresent());
    assertTrue(
        result.findings().stream().noneMatch(f -> f.code() == FindingCode.ORIENTATION_REVERSED));
  }

  private static String wall(
      String name, String leaves, String enters, String corner, String edges) {
    return "  %s:\n    leaves: %s\n    enters: %s\n    surface: {rectangle: {corner: [%s], edges: [%s]}}\n    flux: none\n"
        .formatted(name, leaves, enters, corner, edges);
  }

  private static String cuboid(String volume, double length) {
    String x = length + ", 0, 0";
    return wall(volume + "-end", volume, "surroundings", x, "[0, 1, 0], [0, 0, 1]")
        + wall(volume + "-front", volume, "surroundings", "0, 0, 0", "[" + x + "], [0, 0, 1]")
        + wall(volume + "-back", volume, "surroundings", "0, 1, 0", "[0, 0, 1], [" + x + "]")
        + wall(volume + "-floor", volume, "surroundings", "0, 0, 0", "[0, 1, 0], [" + x + "]")
        + wall(volume + "-lid", volume, "surroundings", "0, 0, 1", "[" + x + "], [0, 1, 0]");
  }

  @Test
  void sharedPatchTurnedIsOneReversal() {
    String yaml =
        """
        format: hullsum-case/1
        units: none
        volumes: {first: {}, second: {}}
        patches:
        """
            + wall("middle", "first", "second", "1, 0, 0", "[0, 0, 1], [0, 1, 0]")
            + cuboid("first", 1).replaceAll("(?s)  first-end:.*?  first-front:", "  first-front:")
            + wall("first-start", "first", "surroundings", "0, 0, 0", "[0, 0, 1], [0, 1, 0]")
            + cuboid("second", 2)
                .replace("corner: [0, 0, 0]", "corner: [1, 0, 0]")
                .replace("corner: [0, 1, 0]", "corner: [1, 1, 0]")
                .replace("corner: [0, 0, 1]", "corner: [1, 0, 1]")
                .replace("[2.0, 0, 0]]", "[1, 0, 0]]")
                .replace("[[2.0, 0, 0]", "[[1, 0, 0]");
    CaseResult result = audit(yaml);
    List<Finding> reversals =
        result.findings().stream()
            .filter(f -> f.code() == FindingCode.ORIENTATION_REVERSED)
            .toList();
    assertEquals(1, reversals.size(), () -> result.findings().toString());
    assertEquals(Optional.of("middle"), reversals.get(0).on());
    assertEquals(Severity.WARNING, reversals.get(0).severity());
  }

  @Test
  void meteredNozzleWithoutSurfaceLeavesClosednessNotApplicable() {
    CaseResult result =
        new BoxCase()
            .flux("none")
            .interior("{generation: {per-volume: \"2*x\"}}")
            .patch("drain", "    leaves: box\n    flux: {metered: 12}\n")
            .audit();
    BalanceResult balance = only(result);
    assertEquals(Optional.empty(), result.surfaces().get(0).closed());
    assertTrue(result.surfaces().get(0).reason().orElseThrow().startsWith("not applicable"));
    assertEquals(12, balance.interior().orElseThrow(), 1e-8);
    assertEquals(Verdict.BALANCED, balance.verdict());
  }

  @Test
  void sourceInsideSurfacesThatDoNotCloseIsNotIntegrated() {
    CaseResult result =
        new BoxCase()
            .flux("none")
            .interior("{generation: {per-volume: \"2*x\"}}")
            .patch("drain", "    leaves: box\n    flux: {metered: 12}\n")
            .without("lid")
            .audit();
    assertEquals(Verdict.UNDECIDED, only(result).verdict());
    assertTrue(only(result).interior().isEmpty());
    assertTrue(finding(result, FindingCode.SURFACE_OPEN, "box").isPresent());
  }

  @Test
  void facingByAFigureThatVanishesIsDegenerate() {
    CaseResult result = new BoxCase().patch("left", "    facing: upward\n").audit();
    assertTrue(finding(result, FindingCode.PATCH_DEGENERATE, "left").isPresent());
    assertEquals(Verdict.UNDECIDED, only(result).verdict());
  }

  @ParameterizedTest
  @CsvSource({"upward, lid, false", "downward, lid, true", "upward, floor, true"})
  void facingUpwardAndDownwardAreByTheVectorArea(String facing, String patch, boolean wrong) {
    CaseResult result = new BoxCase().patch(patch, "    facing: " + facing + "\n").audit();
    assertEquals(wrong, finding(result, FindingCode.ORIENTATION_REVERSED, patch).isPresent());
  }

  @Test
  void facingAwayFromAPointInsideIsOutwardOnEveryPatch() {
    BoxCase box = new BoxCase();
    for (String face : List.of("left", "right", "front", "back", "floor", "lid")) {
      box.patch(face, "    facing: {away-from: [1, 1, 0.5]}\n");
    }
    assertFalse(box.audit().hasError());
  }

  @Test
  void volumeWithoutPatchesIsUnbounded() {
    CaseResult result =
        audit(
            """
            format: hullsum-case/1
            units: none
            volumes: {tank: {}, lost: {}}
            patches:
              in: {leaves: surroundings, enters: tank, flux: {metered: 1}}
              out: {leaves: tank, flux: {metered: 1}}
            """);
    assertTrue(finding(result, FindingCode.VOLUME_UNBOUNDED, "lost").isPresent());
    assertEquals(Verdict.UNDECIDED, balance(result, "lost").verdict());
    assertEquals(Verdict.BALANCED, balance(result, "tank").verdict());
  }

  @Test
  void unusedParameterAndFieldAreNotedUsedOnesAreNot() {
    CaseResult result =
        new BoxCase()
            .also("parameters: {idle: 3, busy: 2, tilt: 1}\n")
            .patch("lid", "    facing: {along: [0, 0, tilt]}\n")
            .flux("{field: flow, times: busy}")
            .interior("")
            .audit();
    assertTrue(finding(result, FindingCode.NAME_UNUSED, "idle").isPresent());
    assertTrue(finding(result, FindingCode.NAME_UNUSED, "busy").isEmpty());
    assertTrue(finding(result, FindingCode.NAME_UNUSED, "tilt").isEmpty());
    assertTrue(finding(result, FindingCode.NAME_UNUSED, "flow").isEmpty());
  }

  @Test
  void waivedErrorDoesNotCountAndTheVerdictStands() {
    CaseResult result =
        new BoxCase()
            .patch("lid", "    facing: reversed\n")
            .also(
                """
                waivers:
                  - {finding: orientation-reversed, where: lid, because: drawn so, by: R. Quill}
                """)
            .audit();
    assertFalse(result.hasError());
    assertEquals(Verdict.IMBALANCED, only(result).verdict());
  }

  @Test
  void claimByAFieldIsTheFluxOfThatField() {
    BoxCase box =
        new BoxCase()
            .field("1", "0", "0")
            .interior("")
            .patch("right", "    flux: {metered: 3}\n    claim: {field: flow}\n")
            .patch("left", "    flux: {metered: -3.1}\n    claim: {field: flow}\n");
    CaseResult result = box.audit();
    assertTrue(finding(result, FindingCode.CLAIM_MISSED, "right").isEmpty());
    assertTrue(finding(result, FindingCode.CLAIM_MISSED, "left").isPresent());
  }

  @Test
  void fieldThatJumpsInsideIsWarnedOf() {
    CaseResult result = new BoxCase().field("if(x < 1, 1, 2)", "0", "0").audit();
    assertTrue(finding(result, FindingCode.FIELD_DISCONTINUOUS, "box").isPresent());
    assertEquals(Verdict.IMBALANCED, only(result).verdict());
  }

  @Test
  void outflowThatEmptiesTheVolumeBalancesAtEveryInstantAndOverTheInterval() {
    CaseResult result =
        new BoxCase()
            .flux("none")
            .patch("lid", "    flux: {flux-density: \"exp(-t)\"}\n")
            .interior("{accumulation: {per-volume: \"exp(-t)\"}}")
            .also("time: {from: 0, to: 2, steps: 8}\n")
            .audit();
    assertEquals(10, result.balances().size());
    for (BalanceResult balance : result.balances()) {
      assertEquals(Verdict.BALANCED, balance.verdict(), balance.reason());
    }
    BalanceResult mean = result.balances().get(9);
    double exact = 6 * (1 - Math.exp(-2)) / 2;
    double error =
        mean.lines().stream().mapToDouble(BalanceResult.Line::numericalError).max().orElseThrow();
    assertEquals(exact, mean.outward().orElseThrow(), error);
    assertEquals(exact, mean.outward().orElseThrow(), 1e-3);
    // What flows and what is kept err alike, so their difference does not err.
    assertTrue(mean.numericalError().orElseThrow() < 1e-10, "" + mean.numericalError());
  }

  /** The density multiplies what enters and what leaves: its uncertainty counts once, with sign. */
  @Test
  void factorOnBothSidesCountsWithItsSigns() {
    CaseResult result =
        audit(
            """
            format: hullsum-case/1
            quantity: mass
            parameters: {rho: 1000 kg/m3 ± 1 % (k=1)}
            volumes: {tank: {}}
            patches:
              in: {leaves: surroundings, enters: tank, flux: {metered: 0.10 m3/s, times: rho}}
              out: {leaves: tank, flux: {metered: 0.09 m3/s, times: rho}}
            """);
    BalanceResult balance = only(result);
    assertEquals(-10, balance.residual().orElseThrow(), 1e-9);
    assertEquals(0.1, balance.standardUncertainty(), 1e-9);
    assertEquals("rho", balance.budget().get(0).source());
  }

  @Test
  void patchesThatBoundNothingAreReportedWithoutVerdict() {
    CaseResult result =
        audit(
            """
            format: hullsum-case/1
            units: none
            volumes: none
            fields: {flow: {vector: ["0", "0", "2"]}}
            patches:
              plate:
                surface: {rectangle: {corner: [0, 0, 0], edges: [[1, 0, 0], [0, 1, 0]]}}
                flux: {field: flow}
            """);
    assertEquals(Optional.empty(), result.verdict());
    assertEquals(2, result.patches().get(0).fluxes().get(0).value().orElseThrow(), 1e-9);
    assertEquals(Optional.empty(), result.patches().get(0).foundFacing());
  }

  @Test
  void twoMissedClaimsOfOnePatchAreTwoFindings() {
    CaseResult result =
        new BoxCase()
            .flux("none")
            .interior("")
            .patch("lid", "    flux: {metered: 3}\n    claim: [4, 5]\n")
            .audit();
    assertEquals(
        2, result.findings().stream().filter(f -> f.code() == FindingCode.CLAIM_MISSED).count());
  }

  /** The radius moves both sides alike, so the identity is as certain as without it. */
  @Test
  void uncertainGeometryCancelsInTheIdentity() {
    CaseResult result =
        audit(
            """
            format: hullsum-case/1
            units: none
            parameters: {radius: 2 ± 0.1 (k=2)}
            fields: {flow: {vector: ["x", "sin(y)", "z^2"]}}
            volumes: {can: {interior: {divergence-of: flow}}}
            patches:
              wall:
                surface: {cylinder: {from: [0, 0, 0], to: [0, 0, 1], radius: radius}}
                flux: {field: flow}
              floor:
                surface: {disk: {centre: [0, 0, 0], normal: [0, 0, -1], radius: radius}}
                flux: {field: flow}
              lid:
                surface: {disk: {centre: [0, 0, 1], normal: [0, 0, 1], radius: radius}}
                flux: {field: flow}
            """);
    assertEquals(0, only(result).standardUncertainty());
    assertEquals(Verdict.BALANCED, only(result).verdict());
    assertTrue(only(result).lines().get(0).standardUncertainty() > 0);
  }

  @Test
  void poleOfAFieldAtAStatedSourceIsAWarningAndTheCheckStands() {
    CaseResult result =
        audit(
            """
            format: hullsum-case/1
            quantity: energy
            fields:
              heat:
                coordinates: spherical
                vector: ["25 W/(pi*r^2)", "0", "0"]
                unit: W/m2
            volumes:
              ball: {interior: {generation: 100 W}}
            patches:
              skin:
                leaves: ball
                surface: {sphere: {centre: [0.1, 0, 0], radius: 1}}
                flux: {field: heat}
            """);
    assertEquals(Verdict.BALANCED, only(result).verdict());
    Finding pole =
        result.findings().stream()
            .filter(f -> f.code() == FindingCode.FIELD_SINGULAR)
            .findFirst()
            .orElseThrow();
    assertEquals(Severity.WARNING, pole.severity());
  }

  private static CaseResult wrapped(String surface) {
    return audit(
        """
        format: hullsum-case/1
        units: none
        fields: {flow: {vector: [x, y, z]}}
        volumes: {v: {interior: {divergence-of: flow}}}
        patches:
          skin: {leaves: v, surface: SURFACE, flux: {field: flow}}
        """
            .replace("SURFACE", surface));
  }

  @Test
  void sphereThatIsWrappedTwiceIsNotCalledClosed() {
    CaseResult result =
        wrapped(
            "{parametric: {point: [sin(u)*cos(v), sin(u)*sin(v), cos(u)], u: [0, pi],"
                + " v: [0, 4*pi]}}");
    assertEquals(Optional.empty(), result.surfaces().get(0).closed());
    assertEquals(Verdict.UNDECIDED, only(result).verdict());
  }

  @Test
  void surfaceWhosePointsLeaveTheRangeOfNumbersIsDegenerateAndNothingIsDecided() {
    CaseResult result = wrapped("{sphere: {centre: [1e308, 0, 0], radius: 1e308}}");
    assertTrue(result.findings().stream().anyMatch(f -> f.code() == FindingCode.PATCH_DEGENERATE));
    assertEquals(Verdict.UNDECIDED, only(result).verdict());
  }
}
