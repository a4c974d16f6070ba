package org.hullsum.report;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.audit.AuditResult;
import org.hullsum.audit.BalanceResult;
import org.hullsum.audit.CaseResult;
import org.hullsum.audit.Explanation;
import org.hullsum.audit.PatchResult;
import org.hullsum.audit.SurfaceResult;
import org.hullsum.audit.Verdict;
import org.hullsum.model.Case;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;
import org.hullsum.problem.Place;
import org.hullsum.problem.Problem;
import org.hullsum.problem.ProblemKind;

/** Results made by hand, so that the reports are tested without an audit. */
final class ExampleResults {
  private ExampleResults() {}

  static AuditResult of(CaseResult... cases) {
    return new AuditResult(
        List.of(cases),
        new AuditResult.Provenance(
            "hullsum 0.1.0",
            "closures over blocks",
            "2026-03-01T02:03:04Z",
            Map.of("NAME", "5 m"),
            List.of(new Case.SourceFile("basin.yaml", "ab12"))));
  }

  static BalanceResult.Line line(String patch, int sign, double outward) {
    return new BalanceResult.Line(patch, sign, Optional.of(outward), 2.5e-12, 0);
  }

  /** An identity check that holds, with a wall that nothing passes. */
  static BalanceResult identity() {
    return new BalanceResult(
        "basin",
        Optional.of("Filtrate basin"),
        false,
        "volume",
        "m3/s",
        Optional.empty(),
        Optional.empty(),
        BalanceResult.Check.IDENTITY,
        List.of(
            line("bed", 1, -0.6031857894892404),
            line("wall", 1, 0),
            line("top", 1, 0.6031857894892403)),
        Optional.of(-1.1e-16),
        Optional.of(0.0),
        Optional.of(-1.1e-16),
        List.of(
            new BalanceResult.Term(
                "divergence", Optional.of(0.0), Optional.of(3e-13), 0, "cones", Optional.of("0"))),
        0.603,
        BalanceResult.Rule.TOLERANCE,
        Optional.of(6.03e-7),
        Optional.of(7.8e-12),
        0,
        1.959963984540054,
        Optional.empty(),
        Optional.empty(),
        List.of(),
        Optional.empty(),
        Optional.empty(),
        Verdict.BALANCED,
        "The residual and its margin lie within the tolerance.");
  }

  /** A metered conservation check that does not hold, at an instant or timeless. */
  static BalanceResult metered(Optional<Double> at, double residual, Verdict verdict) {
    return new BalanceResult(
        "sump",
        Optional.empty(),
        false,
        "volume",
        "m3/h",
        at,
        Optional.empty(),
        BalanceResult.Check.CONSERVATION,
        List.of(
            new BalanceResult.Line("feed", -1, Optional.of(-41.8), 0, 0.3),
            new BalanceResult.Line("filtrate", 1, Optional.of(31.25), 0, 0.05),
            new BalanceResult.Line("reject", 1, Optional.of(10.55 + residual), 0, 0.1)),
        Optional.of(residual),
        Optional.of(0.0),
        Optional.of(residual),
        List.of(),
        41.8,
        BalanceResult.Rule.UNCERTAINTY,
        Optional.empty(),
        Optional.of(0.0),
        0.32,
        1.96,
        Optional.of(1.15),
        Optional.of(0.02),
        List.of(
            new BalanceResult.Contribution("feed metered", 0.3, 0.879),
            new BalanceResult.Contribution("reject metered", 0.1, 0.098),
            new BalanceResult.Contribution("filtrate metered", 0.05, 0.023)),
        Optional.empty(),
        Optional.empty(),
        verdict,
        "The residual lies outside its expanded uncertainty.");
  }

  /** A balance with an unknown flux: undecided, without a residual. */
  static BalanceResult undecided() {
    return new BalanceResult(
        "station",
        Optional.empty(),
        true,
        "volume",
        "m3/h",
        Optional.empty(),
        Optional.of(new BalanceResult.Interval(0, 60)),
        BalanceResult.Check.CONSERVATION,
        List.of(
            new BalanceResult.Line("feed", -1, Optional.of(-41.8), 0, 0.3),
            new BalanceResult.Line("vent", 1, Optional.empty(), 0, 0)),
        Optional.empty(),
        Optional.of(-2.0),
        Optional.empty(),
        List.of(
            new BalanceResult.Term(
                "accumulation",
                Optional.of(-2.0),
                Optional.of(0.0),
                0.1,
                "stated",
                Optional.empty())),
        41.8,
        BalanceResult.Rule.UNCERTAINTY,
        Optional.empty(),
        Optional.empty(),
        0.32,
        1.96,
        Optional.empty(),
        Optional.empty(),
        List.of(),
        Optional.of(new BalanceResult.Closing("vent", 39.8)),
        Optional.of(
            new BalanceResult.Term(
                "divergence",
                Optional.of(0.25),
                Optional.of(1e-9),
                0,
                "columns",
                Optional.of("2*lift*z"))),
        Verdict.UNDECIDED,
        "The flux through vent is unknown.");
  }

  static PatchResult patch(String name, double area, PatchResult.FoundFacing found) {
    return new PatchResult(
        name,
        Optional.of("the " + name),
        "basin",
        "surroundings",
        Optional.of(area),
        Optional.of(new Vector3(0, 0, -area)),
        List.of(
            new PatchResult.Flux(
                "volume", "m3/s", Optional.empty(), Optional.of(-0.603), 2.5e-12, 0, 289, "field")),
        List.of(),
        "as-drawn",
        Optional.of(found),
        found == PatchResult.FoundFacing.UNDETERMINED
            ? Optional.of("sides alike")
            : Optional.empty());
  }

  /** A case in which everything that a report shows occurs. */
  static CaseResult everything() {
    Map<String, Object> evidence = new LinkedHashMap<>();
    evidence.put("flux", -0.6031857894892404);
    evidence.put("normal", new double[] {0, 0, -1});
    evidence.put("points", 5);
    evidence.put("agreed", true);
    evidence.put("volume", "basin");
    evidence.put("rays", List.of(1.0, "two", Double.NaN));
    return new CaseResult(
        "basin.yaml",
        Optional.of("Filtrate basin <north> & \"south\""),
        Optional.of("Marrow Point pilot plant, summer operating point."),
        "m",
        List.of(
            new Problem(
                ProblemKind.SUSPICIOUS, new Place("basin.yaml", 3, 7), "a key without a blank")),
        List.of("gal was taken as the US gallon."),
        List.of(identity(), metered(Optional.empty(), 1.75, Verdict.IMBALANCED), undecided()),
        List.of(
            patch("bed", 50.26548245743669, PatchResult.FoundFacing.INWARD),
            patch("wall", 80.42477193189871, PatchResult.FoundFacing.OUTWARD),
            patch("top", 50.26548245743669, PatchResult.FoundFacing.UNDETERMINED)),
        List.of(
            new SurfaceResult(
                "basin",
                Optional.empty(),
                Optional.of("necessary conditions hold, seams were not followed"),
                Optional.of(1),
                Optional.of(new Vector3(0, 0, 1e-15)),
                Optional.of(160.84954386379742),
                Optional.of(List.of(160.8, 0.0, 0.0, 0.0, 160.8, 0.0, 0.0, 0.0, 160.8)),
                List.of()),
            new SurfaceResult(
                "sump",
                Optional.of(false),
                Optional.of("the area vectors do not cancel"),
                Optional.empty(),
                Optional.empty(),
                Optional.empty(),
                Optional.empty(),
                List.of(
                    new SurfaceResult.Gap(
                        List.of("wall", "lid"),
                        3.5,
                        new Vector3(1, 2, 3),
                        0.75,
                        Optional.of(0.1))))),
        List.of(
            Finding.of(
                FindingCode.ORIENTATION_REVERSED,
                "The normal points into basin; turn its facing.",
                "bed",
                Optional.of(new Place("basin.yaml", 21, 3)),
                evidence),
            Finding.of(
                    FindingCode.CLAIM_MISSED,
                    "The claim of 3 m3/h is missed.",
                    "top",
                    Optional.of(new Place("basin.yaml", 30, 5)),
                    Map.of())
                .waivedBecause("commissioning run")),
        List.of(
            new Explanation(
                Explanation.Kind.REVERSED,
                "sump",
                List.of("bed"),
                Optional.empty(),
                Optional.of(1.75),
                1e-9,
                0.9999999994,
                true,
                List.of(1),
                "Turned, the bed would close the balance."),
            new Explanation(
                Explanation.Kind.LEFT_OUT,
                "sump",
                List.of(),
                Optional.of(2.0),
                Optional.empty(),
                0.5,
                0.7142857142857143,
                false,
                List.of(),
                "A flow of 1.25 m3/h that the case does not name.")),
        Optional.of(0.35),
        Optional.of(0.98305));
  }

  static CaseResult unreadable() {
    return CaseResult.unreadable(
        "bad.yaml",
        List.of(
            new Problem(
                ProblemKind.UNKNOWN_KEY,
                new Place("bad.yaml", 4, 3),
                "unknown key 'raduis'; did you mean 'radius'?"),
            new Problem(ProblemKind.UNIT, new Place("bad.yaml", 9, 12), "'m3/hh' is not a unit")));
  }

  /** A file that is not there. */
  static CaseResult missing() {
    return CaseResult.unreadable(
        "none.yaml",
        List.of(
            new Problem(
                ProblemKind.FILE_UNREADABLE, Place.wholeFile("none.yaml"), "there is no file")));
  }

  /** A case with one explanation of the given residual. */
  static CaseResult explained(double residualThen) {
    return new CaseResult(
        "sump.yaml",
        Optional.empty(),
        Optional.empty(),
        "m",
        List.of(),
        List.of(),
        List.of(metered(Optional.empty(), 1.75, Verdict.IMBALANCED)),
        List.of(),
        List.of(),
        List.of(),
        List.of(
            new Explanation(
                Explanation.Kind.COUNTED_TWICE,
                "sump",
                List.of("feed"),
                Optional.empty(),
                Optional.of(1.75),
                residualThen,
                0,
                false,
                List.of(),
                "The feed may be counted twice.")),
        Optional.empty(),
        Optional.empty());
  }

  /** A case at many instants and over the interval. */
  static CaseResult series(int instants) {
    List<BalanceResult> balances = new ArrayList<>();
    for (int i = 0; i < instants; i++) {
      boolean bad = i == instants / 2;
      balances.add(
          metered(
              Optional.of(0.5 * i),
              bad ? 1.75 : 0.125,
              bad ? Verdict.IMBALANCED : Verdict.BALANCED));
    }
    return new CaseResult(
        "tide.yaml",
        Optional.of("Tidal basin"),
        Optional.empty(),
        "m",
        List.of(),
        List.of(),
        balances,
        List.of(),
        List.of(),
        List.of(),
        List.of(),
        Optional.empty(),
        Optional.empty());
  }
}
