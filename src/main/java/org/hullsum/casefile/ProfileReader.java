package org.hullsum.casefile;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Simplifier;
import org.hullsum.model.FluxStatement;
import org.hullsum.problem.ProblemKind;
import org.hullsum.units.Dimension;

/** Reads velocity profiles over disks. */
final class ProfileReader {
  private static final List<String> LAWS = List.of("power-law", "laminar", "uniform", "log-law");
  private static final List<String> SPEEDS = List.of("centreline", "mean");

  private final FormulaReader formulas;
  private final ValueReader values;
  private final MeasuredReader measured;
  private final ProblemAccumulator problems;

  ProfileReader(FormulaReader formulas, MeasuredReader measured) {
    this.formulas = formulas;
    this.values = formulas.values();
    this.measured = measured;
    this.problems = values.problems();
  }

  /**
   * A profile.
   *
   * @param surface of the patch, empty where it has none or it was refused
   * @param wanted what its flux density must measure, empty for any
   */
  Optional<FluxStatement> read(
      YamlValue value, Optional<SurfaceEntry> surface, String patch, Optional<Dimension> wanted) {
    Optional<MapReader> section = values.section(value, Section.PROFILE);
    if (section.isEmpty()) {
      return Optional.empty();
    }
    MapReader map = section.get();
    Optional<String> law = one(map, LAWS, "a profile follows one of ");
    Optional<String> speed = one(map, SPEEDS, "a profile states one speed, ");
    if (surface.isEmpty() || law.isEmpty() || speed.isEmpty()) {
      return Optional.empty();
    }
    Optional<SurfaceEntry.Disk> disk =
        surface
            .get()
            .disk()
            .filter(SurfaceEntry.Disk::whole)
            .or(() -> new MeshDisk(formulas).read(map, surface.get()).map(MeshDisk.Stated::disk));
    if (disk.isEmpty() && surface.get().kind().equals("mesh")) {
      return Optional.empty();
    }
    if (disk.isEmpty()) {
      problems.add(
          ProblemKind.WRONG_VALUE,
          value.place(),
          "a profile stands over a disk without a hole; this patch is "
              + (surface.get().disk().isPresent() ? "a ring" : "a " + surface.get().kind()));
      return Optional.empty();
    }
    Need need = new Need("the speed", Map.of(), wanted, Optional.empty());
    Optional<Expression> stated =
        map.get(speed.get())
            .flatMap(v -> measured.measured(v, patch + " " + speed.get(), need))
            .map(Formula::expression);
    Optional<ProfileLaw> shape = law(map, law.get(), disk.get());
    boolean mean = speed.get().equals("mean");
    return Together.of(stated, shape, (s, p) -> profile(s, p, mean));
  }

  private static FluxStatement profile(Expression speed, ProfileLaw law, boolean mean) {
    Expression centreline = mean ? speed.over(law.meanShare()) : speed;
    return new FluxStatement.Profile(
        Simplifier.simplify(centreline.times(law.share())), law.text());
  }

  private Optional<String> one(MapReader map, List<String> keys, String rule) {
    List<String> present = map.present(keys);
    if (present.size() == 1) {
      return Optional.of(present.get(0));
    }
    if (!map.faulty()) {
      problems.add(
          present.isEmpty() ? ProblemKind.MISSING_KEY : ProblemKind.WRONG_VALUE,
          map.place(),
          rule
              + String.join(", ", keys)
              + "; here "
              + (present.isEmpty() ? "is none" : "are " + String.join(" and ", present)));
    }
    return Optional.empty();
  }

  private Optional<ProfileLaw> law(MapReader map, String law, SurfaceEntry.Disk disk) {
    return switch (law) {
      case "power-law" ->
          map.get(law)
              .flatMap(v -> positive(v, Need.plain("the exponent n of `power-law`")))
              .map(n -> ProfileLaw.power(disk, n.expression(), n.printed()));
      case "log-law" ->
          map.get(law)
              .flatMap(v -> values.section(v, Section.LOG_LAW))
              .flatMap(m -> m.require("roughness"))
              .flatMap(v -> positive(v, Need.length("`roughness`")))
              .map(e -> ProfileLaw.logarithmic(disk, e.expression(), e.printed()));
      case "laminar" -> bare(map, law).map(m -> ProfileLaw.laminar(disk));
      default -> bare(map, law).map(m -> ProfileLaw.uniform());
    };
  }

  /** A law that needs no figure: its key has no value, or {@code true}. */
  private Optional<MapReader> bare(MapReader map, String law) {
    if (map.isBare(law)) {
      return Optional.of(map);
    }
    problems.add(
        ProblemKind.WRONG_VALUE,
        map.placeOf(law),
        "`" + law + "` needs no value: write {" + law + ": true, centreline: 2.0 m/s}");
    return Optional.empty();
  }

  /** A formula of parameters with how it was written. */
  private record Written(Expression expression, String printed) {}

  private Optional<Written> positive(YamlValue value, Need need) {
    Optional<Expression> expression = formulas.expression(value, need);
    Optional<Double> number = expression.flatMap(formulas.scope()::value);
    if (number.isPresent() && !(number.get() > 0 && Double.isFinite(number.get()))) {
      problems.add(
          ProblemKind.WRONG_VALUE,
          value.place(),
          need.what() + " must be greater than zero; it is " + number.get());
      return Optional.empty();
    }
    String printed = value.asText().map(t -> t.text().strip()).orElse("");
    return expression.map(e -> new Written(e, printed));
  }
}
