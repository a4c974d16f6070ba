package org.hullsum.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.hullsum.casefile.CaseReader;
import org.hullsum.casefile.ReadOptions;
import org.hullsum.casefile.ReadOutcome;
import org.hullsum.model.Case;
import org.hullsum.model.Facing;
import org.hullsum.model.Patch;
import org.hullsum.model.Volume;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;

/** Reads and audits cases, changed in single ways. */
final class Audits {
  static final LocalDate TODAY = LocalDate.of(2030, 1, 1);

  private Audits() {}

  static Case shipped(String name) {
    return read(Path.of("cases", name + ".yaml"));
  }

  static Case text(String yaml) {
    try {
      Path file = Files.createTempFile("hullsum", ".yaml");
      Files.write(file, yaml.getBytes(StandardCharsets.UTF_8));
      Case found = read(file);
      Files.delete(file);
      return found;
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static Case read(Path file) {
    ReadOutcome outcome = CaseReader.read(file, ReadOptions.named("case.yaml"));
    assertTrue(outcome.found().isPresent(), () -> outcome.problems().toString());
    return outcome.found().get();
  }

  static CaseResult audit(Case audited) {
    return Auditor.audit(audited, AuditOptions.usual(TODAY));
  }

  static CaseResult audit(String yaml) {
    return audit(text(yaml));
  }

  /** The case with other patches. */
  static Case with(Case audited, List<Patch> patches) {
    return rebuilt(audited, audited.volumes(), patches);
  }

  /** The case with every interior left out. */
  static Case withoutInteriors(Case audited) {
    List<Volume> volumes =
        audited.volumes().stream()
            .map(v -> new Volume(v.name(), v.label(), List.of(), v.tolerances(), v.place()))
            .toList();
    return rebuilt(audited, volumes, audited.patches());
  }

  /** The case with other volumes, of nothing but their names. */
  static Case withVolumes(Case audited, String... names) {
    List<Volume> volumes =
        Arrays.stream(names)
            .map(
                n ->
                    new Volume(
                        n,
                        Optional.empty(),
                        List.of(),
                        audited.volumes().get(0).tolerances(),
                        audited.volumes().get(0).place()))
            .toList();
    return rebuilt(audited, volumes, audited.patches());
  }

  private static Case rebuilt(Case a, List<Volume> volumes, List<Patch> patches) {
    return new Case(
        a.file(),
        a.title(),
        a.about(),
        a.quantity(),
        a.working(),
        a.inputs(),
        a.fields(),
        volumes,
        patches,
        a.envelopes(),
        a.schedule(),
        a.waivers(),
        a.fieldPlaces(),
        a.warnings(),
        a.notes(),
        a.sources(),
        a.usedNames());
  }

  /** The case with one patch turned. */
  static Case turned(Case audited, String patch) {
    return with(
        audited,
        audited.patches().stream().map(p -> p.name().equals(patch) ? turned(p) : p).toList());
  }

  private static Patch turned(Patch p) {
    Facing facing =
        p.facing() instanceof Facing.AsDrawn ? new Facing.Reversed() : new Facing.AsDrawn();
    return new Patch(
        p.name(),
        p.label(),
        p.about(),
        p.leaves(),
        p.enters(),
        p.surface(),
        facing,
        p.fluxes(),
        p.claims(),
        p.place(),
        p.facingPlace());
  }

  static BalanceResult balance(CaseResult result, String volume) {
    return result.balances().stream()
        .filter(b -> b.volume().equals(volume))
        .findFirst()
        .orElseThrow();
  }

  static BalanceResult only(CaseResult result) {
    assertEquals(1, result.balances().size());
    return result.balances().get(0);
  }

  static Optional<Finding> finding(CaseResult result, FindingCode code, String on) {
    return result.findings().stream()
        .filter(f -> f.code() == code && f.on().filter(on::equals).isPresent())
        .findFirst();
  }
}
