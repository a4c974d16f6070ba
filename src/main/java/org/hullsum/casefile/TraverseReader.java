package org.hullsum.casefile;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.hullsum.expression.Expression;
import org.hullsum.model.FluxStatement;
import org.hullsum.model.Input;
import org.hullsum.model.TraverseReadings;
import org.hullsum.problem.Place;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;
import org.hullsum.quadrature.ScatteredMean;
import org.hullsum.quadrature.TraverseRule;
import org.hullsum.units.Dimension;
import org.hullsum.units.MeasuredQuantity;
import org.hullsum.units.MeasuredQuantityParser;
import org.hullsum.units.Quantity;
import org.hullsum.units.Unit;

/**
 * Reads traverses: point readings over a duct's section, whose mean by a rule times the area is the
 * flux. Every reading is an input, and so is the rule, whose own uncertainty is what it errs by
 * over power-law profiles unless {@code rule-uncertainty} states another.
 */
final class TraverseReader {
  private static final String INTERPOLATED = "interpolated";
  private static final List<String> SPEEDS = List.of("speed", "components", "pressure");

  /** 40 CFR 60 appendix A-1, method 1, section 11.4: a mean angle above it is no axial flow. */
  private static final double MOST_SWIRL = 20;

  private final FormulaReader formulas;
  private final ValueReader values;
  private final CaseScope scope;
  private final MeasuredReader measured;
  private final ProblemAccumulator problems;
  private final DataFiles files;

  TraverseReader(FormulaReader formulas, MeasuredReader measured, DataFiles files) {
    this.formulas = formulas;
    this.values = formulas.values();
    this.scope = formulas.scope();
    this.measured = measured;
    this.problems = values.problems();
    this.files = files;
  }

  /**
   * A traverse.
   *
   * @param surface of the patch, empty where it has none or it was refused
   * @param wanted what its flux density must measure, empty for any
   */
  Optional<FluxStatement> read(
      YamlValue value, Optional<SurfaceEntry> surface, String patch, Optional<Dimension> wanted) {
    Optional<MapReader> keys = values.section(value, Section.TRAVERSE);
    if (keys.isEmpty()) {
      return Optional.empty();
    }
    MapReader map = keys.get();
    Optional<String> rule = map.require("rule").flatMap(this::rule);
    Optional<YamlText> name = map.require("readings").flatMap(v -> values.text(v, "`readings`"));
    Optional<MapReader> at = map.require("at").flatMap(v -> values.section(v, Section.TRAVERSE_AT));
    Optional<DuctSection> section = surface.flatMap(s -> section(map, s));
    Optional<Path> file = name.flatMap(files::find);
    Optional<ReadingsTable> table = file.flatMap(f -> ReadingsTable.read(f, name.get(), problems));
    Optional<List<ReadingsTable.Column>> columns = table.flatMap(t -> columns(map, t));
    if (rule.isEmpty() || at.isEmpty() || section.isEmpty() || columns.isEmpty()) {
      return Optional.empty();
    }
    Subject subject = new Subject(map, rule.get(), patch, section.get(), table.get());
    Optional<List<TraversePoint>> points =
        new TraversePlaces(scope, table.get(), section.get(), subject.text(scope))
            .read(at.get(), columns.get().get(0));
    Optional<Weights> weights = points.flatMap(p -> weights(subject, p));
    Optional<TraverseSpeeds.Speeds> speeds =
        weights.flatMap(
            w ->
                new TraverseSpeeds(formulas, measured, patch)
                    .read(map, table.get(), columns.get(), section.get(), wanted));
    speeds.ifPresent(s -> warn(subject, s));
    return speeds.flatMap(s -> statement(subject, points.get(), s, weights.get()));
  }

  /** What a traverse is over, and how it is stated. */
  private record Subject(
      MapReader map, String rule, String patch, DuctSection section, ReadingsTable table) {
    TraverseText text(CaseScope scope) {
      return new TraverseText(section, scope.working());
    }

    boolean interpolated() {
      return rule.equals(INTERPOLATED);
    }
  }

  /**
   * The share of each reading in the mean.
   *
   * @param shares one for each
   * @param error the largest relative error of a rule over power laws
   * @param interpolant of scattered readings, which bounds its error itself
   */
  private record Weights(List<Double> shares, double error, Optional<ScatteredMean> interpolant) {}

  private Optional<String> rule(YamlValue value) {
    List<String> words =
        Stream.concat(
                Stream.of(TraverseRule.values()).map(TraverseRule::word), Stream.of(INTERPOLATED))
            .toList();
    return values.text(value, "`rule`").flatMap(t -> values.word(t, "`rule`", words));
  }

  private Optional<DuctSection> section(MapReader map, SurfaceEntry surface) {
    Optional<DuctSection> ofMesh = new MeshDisk(formulas).read(map, surface).map(d -> d.section());
    if (surface.kind().equals("mesh")) {
      return ofMesh;
    }
    boolean refused = surface.patchSurface().isEmpty();
    if (surface.section().isEmpty() && !refused) {
      problems.add(
          ProblemKind.WRONG_VALUE,
          map.place(),
          "a traverse stands over a whole disk, a rectangle, or a mesh with `centre` and `radius`,"
              + " none of them trimmed; this patch is a "
              + surface.kind()
              + (surface.disk().isPresent() ? " that is a ring, a sector or trimmed" : ""));
    }
    return surface.section();
  }

  /** The column of speeds or pressures, or the three of the components. */
  private Optional<List<ReadingsTable.Column>> columns(MapReader map, ReadingsTable table) {
    List<String> kinds = map.present(SPEEDS);
    if (kinds.size() != 1) {
      if (!map.faulty()) {
        problems.add(
            kinds.isEmpty() ? ProblemKind.MISSING_KEY : ProblemKind.WRONG_VALUE,
            map.place(),
            "a traverse reads one of "
                + String.join(", ", SPEEDS)
                + "; here "
                + (kinds.isEmpty() ? "is none" : "are " + String.join(" and ", kinds)));
      }
      return Optional.empty();
    }
    String kind = kinds.get(0);
    for (String turn : map.present(List.of("yaw", "pitch"))) {
      if (!kind.equals("speed")) {
        problems.add(
            ProblemKind.WRONG_VALUE, map.placeOfKey(turn), "`" + turn + "` belongs to `speed`");
        return Optional.empty();
      }
    }
    Optional<List<YamlValue>> names =
        switch (kind) {
          case "components" ->
              map.get(kind)
                  .flatMap(
                      v -> values.items(v, 3, "`components`", "of three columns, along x, y, z"));
          case "pressure" ->
              map.get(kind)
                  .flatMap(v -> values.section(v, Section.TRAVERSE_PRESSURE))
                  .flatMap(m -> m.require("column"))
                  .map(List::of);
          default -> map.get(kind).map(List::of);
        };
    List<ReadingsTable.Column> columns = new ArrayList<>();
    for (YamlValue name : names.orElse(List.of())) {
      values
          .text(name, "`" + kind + "`")
          .flatMap(t -> table.column(t, problems))
          .ifPresent(columns::add);
    }
    return names.isPresent() && columns.size() == names.get().size()
        ? Optional.of(columns)
        : Optional.empty();
  }

  private Optional<Weights> weights(Subject subject, List<TraversePoint> points) {
    if (!subject.interpolated()) {
      return new TraverseMatch(
              TraverseRule.of(subject.rule()).orElseThrow(),
              subject.section(),
              points,
              subject.table().wholeFile(),
              subject.text(scope),
              problems)
          .weigh()
          .map(w -> new Weights(w.weights(), w.error(), Optional.empty()));
    }
    List<TraversePoint> empty = points.stream().filter(p -> !p.read()).toList();
    empty.forEach(
        p ->
            problems.add(
                ProblemKind.WRONG_VALUE,
                p.place(),
                "no reading here; leave the line out, an interpolation takes what there is"));
    return empty.isEmpty() ? interpolated(subject, points) : Optional.empty();
  }

  private Optional<Weights> interpolated(Subject subject, List<TraversePoint> points) {
    boolean round = subject.section().round();
    double[] x = new double[points.size()];
    double[] y = new double[points.size()];
    for (int i = 0; i < x.length; i++) {
      TraversePoint p = points.get(i);
      x[i] = round ? p.first() * Math.cos(p.second()) : 2 * p.first() - 1;
      y[i] = round ? p.first() * Math.sin(p.second()) : 2 * p.second() - 1;
    }
    ScatteredMean.Outcome outcome = ScatteredMean.of(round, x, y);
    outcome.refusal().ifPresent(refusal -> refuse(subject, points, refusal));
    return outcome
        .mean()
        .map(m -> new Weights(Arrays.stream(m.weights()).boxed().toList(), 0, Optional.of(m)));
  }

  private void refuse(Subject subject, List<TraversePoint> points, ScatteredMean.Refusal refusal) {
    Place place =
        refusal.reading() < 0 ? subject.table().wholeFile() : points.get(refusal.reading()).place();
    problems.add(
        ProblemKind.WRONG_VALUE,
        place,
        switch (refusal.fault()) {
          case FEW ->
              "an interpolation over a section takes "
                  + ScatteredMean.FEWEST
                  + " readings or more; here are "
                  + points.size();
          case AT_WALL ->
              "this reading stands at the wall, where the speed is zero; leave the line out";
          case SAME_PLACE -> "a reading at the same place stands further up; leave one out";
          case ON_A_LINE -> "the readings stand on one line, which tells nothing of the section";
          case HOLE ->
              "there is no reading near "
                  + hole(subject, refusal.x(), refusal.y())
                  + "; what is farther than 0.8 of the radius, or half side, from every reading is"
                  + " not interpolated";
        });
  }

  private String hole(Subject subject, double x, double y) {
    TraverseText text = subject.text(scope);
    return subject.section().round()
        ? text.onRadius(Math.hypot(x, y)) + " at " + TraverseText.degrees(Math.atan2(y, x))
        : text.onSides(0.5 * (1 + x), 0.5 * (1 + y));
  }

  private void warn(Subject subject, TraverseSpeeds.Speeds speeds) {
    if (speeds.swirl().filter(s -> s > MOST_SWIRL).isPresent()) {
      problems.add(
          ProblemKind.SUSPICIOUS,
          subject.map().place(),
          "the flow stands "
              + TraverseText.number(speeds.swirl().get())
              + " deg off the normal on average; above "
              + TraverseText.number(MOST_SWIRL)
              + " deg a section is not fit for a traverse (40 CFR 60, method 1)");
    }
  }

  private Optional<FluxStatement> statement(
      Subject subject, List<TraversePoint> points, TraverseSpeeds.Speeds speeds, Weights weights) {
    Expression mean = mean(speeds.along(), weights.shares());
    Optional<Expression> factor = factor(subject, weights.error());
    if (factor.isEmpty()) {
      return Optional.empty();
    }
    Expression area = subject.section().area();
    double[] numbers = speeds.values().stream().mapToDouble(Double::doubleValue).toArray();
    double bound =
        weights
            .interpolant()
            .map(i -> i.bound(numbers) * scope.value(area).orElse(0.0))
            .orElse(0.0);
    List<TraverseReadings.Reading> readings = new ArrayList<>();
    for (int i = 0; i < points.size(); i++) {
      TraversePoint p = points.get(i);
      readings.add(
          new TraverseReadings.Reading(
              p.first(),
              subject.section().round() ? Math.toDegrees(p.second()) : p.second(),
              numbers[i] / speeds.size(),
              weights.shares().get(i)));
    }
    String source =
        TraverseRule.of(subject.rule())
            .map(TraverseRule::source)
            .orElse("thin-plate spline times (distance from the wall)^(1/7)");
    return Optional.of(
        new FluxStatement.Traverse(
            area.times(mean).times(factor.get()),
            bound,
            new TraverseReadings(
                subject.rule(),
                source,
                subject.section().round(),
                speeds.unit(),
                readings,
                speeds.swirl())));
  }

  private static Expression mean(List<Expression> speeds, List<Double> shares) {
    Expression sum = Expression.number(shares.get(0)).times(speeds.get(0));
    for (int i = 1; i < shares.size(); i++) {
      sum = sum.plus(Expression.number(shares.get(i)).times(speeds.get(i)));
    }
    return sum;
  }

  /** One, with the uncertainty of the rule. */
  private Optional<Expression> factor(Subject subject, double error) {
    Optional<MeasuredQuantity> figure = ruleFigure(subject, error);
    if (figure.isEmpty()) {
      return Optional.empty();
    }
    String name = scope.freshName(subject.patch() + " rule " + subject.rule());
    scope.define(
        new Input(
            name,
            1,
            figure.get().standardUncertainty(),
            figure.get().degreesOfFreedom(),
            Optional.empty(),
            true,
            subject.map().placeOf("rule")),
        Optional.of(Dimension.NONE));
    return Optional.of(Expression.symbol(name));
  }

  private Optional<MeasuredQuantity> ruleFigure(Subject subject, double error) {
    Quantity one = new Quantity(1, Unit.ONE, true);
    if (!subject.map().has("rule-uncertainty")) {
      return Optional.of(
          new MeasuredQuantity(one, error / Math.sqrt(3), Double.POSITIVE_INFINITY, true));
    }
    Optional<YamlText> text =
        subject.map().get("rule-uncertainty").flatMap(v -> values.text(v, "`rule-uncertainty`"));
    if (text.isEmpty()) {
      return Optional.empty();
    }
    try {
      return Optional.of(
          MeasuredQuantityParser.of(scope.usualMeaning(), scope.working())
              .withUncertainty(one, text.get().text())
              .value());
    } catch (TextFault fault) {
      problems.add(text.get(), fault);
      return Optional.empty();
    }
  }
}
