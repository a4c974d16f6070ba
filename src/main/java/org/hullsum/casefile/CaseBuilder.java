package org.hullsum.casefile;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.hullsum.model.Case;
import org.hullsum.model.ConservedQuantity;
import org.hullsum.model.Envelope;
import org.hullsum.model.Inputs;
import org.hullsum.model.Patch;
import org.hullsum.model.Schedule;
import org.hullsum.model.Tolerances;
import org.hullsum.model.Volume;
import org.hullsum.model.Waiver;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;
import org.hullsum.units.UncertaintyMeaning;
import org.hullsum.units.WorkingUnits;

/** Makes one case of one mapping: calls the readers of its parts in the order they need. */
final class CaseBuilder {
  /** The format that this version reads. */
  static final String FORMAT = "hullsum-case/1";

  private final DataFiles files;
  private final FileTextReader.Content content;
  private final ReadOptions options;
  private final ProblemAccumulator problems;
  private final ValueReader values;

  /**
   * @param folder of the case file
   */
  CaseBuilder(
      FileTextReader.Content content,
      Path folder,
      ReadOptions options,
      ProblemAccumulator problems) {
    this.files = new DataFiles(folder, options, problems);
    this.content = content;
    this.options = options;
    this.problems = problems;
    this.values = new ValueReader(problems);
  }

  /** The case; empty where anything was refused. */
  Optional<Case> build(YamlMap map) {
    MapReader top = MapReader.of(map, Section.CASE, problems);
    checkFormat(top);
    WorkingUnits working =
        top.get("units").map(new WorkingUnitsReader(values)::read).orElse(WorkingUnits.SI);
    CaseScope scope = new CaseScope(problems, working, usualMeaning(top));
    FormulaReader formulas = new FormulaReader(scope);
    MeasuredReader measured = new MeasuredReader(formulas);
    new ParameterReader(formulas, measured).readAll(top.get("parameters"), options.parameters());
    Optional<ConservedQuantity> quantity = new ConservedQuantityReader(formulas).read(top);
    Rates rates = Rates.of(quantity, !working.none());
    FieldReader fields = new FieldReader(formulas);
    top.get("fields").ifPresent(fields::readAll);
    TolerancesReader tolerances = tolerances(top, formulas, rates);
    VolumeReader volumeReader = new VolumeReader(values);
    volumeReader.declare(top.get("volumes"));
    List<Volume> volumes =
        volumeReader.read(
            new InteriorReader(formulas, fields, measured, rates),
            tolerances,
            top.placeOfKey("patches"));
    CorrelationReader correlations = new CorrelationReader(formulas);
    FluxReader fluxes = new FluxReader(formulas, fields, measured, correlations, files, rates);
    PatchReader patchReader =
        new PatchReader(formulas, files, fields, measured, fluxes, volumeReader, rates);
    List<Patch> patches = top.require("patches").map(patchReader::readAll).orElse(List.of());
    List<Inputs.Correlation> correlated = correlations.resolve(patchReader.names());
    List<Envelope> envelopes =
        top.get("envelopes").map(v -> volumeReader.envelopes(v, tolerances)).orElse(List.of());
    Schedule schedule =
        top.get("time").map(new ScheduleReader(formulas)::read).orElse(Schedule.TIMELESS);
    checkTime(top, scope);
    List<Waiver> waivers = waivers(top, patchReader, volumeReader, fields, scope);
    Optional<String> title = top.get("title").flatMap(v -> values.freeText(v, "`title`"));
    Optional<String> about = top.get("about").flatMap(v -> values.freeText(v, "`about`"));
    if (problems.fatalCount() > 0 || quantity.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new Case(
            options.name(),
            title,
            about,
            quantity.get(),
            working,
            new Inputs(scope.inputs(), correlated),
            fields.fields(),
            volumes,
            patches,
            envelopes,
            schedule,
            waivers,
            fields.places(),
            problems.warnings(),
            scope.notes(),
            sources(),
            scope.usedNames()));
  }

  private List<Case.SourceFile> sources() {
    List<Case.SourceFile> sources = new ArrayList<>();
    sources.add(new Case.SourceFile(options.name(), content.digest().text()));
    sources.addAll(files.sources());
    return sources;
  }

  /** Reads tolerances whose defaults are those of the case. */
  private static TolerancesReader tolerances(MapReader top, FormulaReader formulas, Rates rates) {
    TolerancesReader plain = new TolerancesReader(formulas, rates.dimension(), Tolerances.NONE);
    Tolerances usual = plain.read(top.get("tolerances"));
    return new TolerancesReader(formulas, rates.dimension(), usual);
  }

  private List<Waiver> waivers(
      MapReader top,
      PatchReader patches,
      VolumeReader volumes,
      FieldReader fields,
      CaseScope scope) {
    Set<String> names = new LinkedHashSet<>(patches.names());
    names.addAll(volumes.names());
    names.addAll(volumes.envelopeNames());
    names.addAll(fields.places().keySet());
    names.addAll(scope.dimensions().keySet());
    return top.get("waivers").map(new WaiverReader(values, names)::read).orElse(List.of());
  }

  private void checkFormat(MapReader top) {
    Optional<YamlText> format = top.require("format").flatMap(v -> values.text(v, "`format`"));
    if (format.isPresent() && !format.get().text().equals(FORMAT)) {
      problems.add(
          ProblemKind.WRONG_VALUE,
          format.get().place(),
          "this program reads the format `" + FORMAT + "`; here is " + format.get().described());
    }
  }

  private Optional<UncertaintyMeaning> usualMeaning(MapReader top) {
    Optional<YamlText> text =
        top.get("uncertainties").flatMap(v -> values.text(v, "`uncertainties`"));
    if (text.isEmpty()) {
      return Optional.empty();
    }
    try {
      return Optional.of(UncertaintyMeaning.parse(text.get().text()));
    } catch (TextFault fault) {
      problems.add(text.get(), fault);
      return Optional.of(new UncertaintyMeaning.CoverageFactor(1));
    }
  }

  private void checkTime(MapReader top, CaseScope scope) {
    if (!top.has("time") && scope.firstUseOfTime().isPresent()) {
      problems.add(
          ProblemKind.MISSING_KEY,
          scope.firstUseOfTime().get(),
          "this depends on t, but the case states no `time` at which it is audited");
    }
  }
}
