package org.hullsum.audit;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import org.hullsum.audit.BalanceResult.Check;
import org.hullsum.model.Case;
import org.hullsum.model.Envelope;
import org.hullsum.model.Tolerances;
import org.hullsum.model.Volume;

/** Of what the balances of a case are drawn: its volumes, then its envelopes. */
final class Subjects {
  private Subjects() {}

  static List<BalanceSubject> of(Case audited, List<SurfaceAudit> surfaces, Scales scales) {
    Map<String, SurfaceAudit> byVolume = new LinkedHashMap<>();
    surfaces.forEach(s -> byVolume.put(s.volume().name(), s));
    Set<String> identities = new LinkedHashSet<>();
    List<BalanceSubject> subjects = new ArrayList<>();
    for (Volume volume : audited.volumes()) {
      boolean identity = FieldUse.isIdentity(volume, audited.patches());
      if (identity) {
        identities.add(volume.name());
      }
      SurfaceAudit surface = byVolume.get(volume.name());
      subjects.add(
          new BalanceSubject(
              volume.name(),
              volume.label(),
              false,
              Set.of(volume.name()),
              identity ? Check.IDENTITY : Check.CONSERVATION,
              scaled(volume.tolerances(), scales),
              surface.unproved(),
              surface.bounded() ? Optional.empty() : surface.noRegion()));
    }
    for (Envelope envelope : audited.envelopes()) {
      List<SurfaceAudit> members = envelope.volumes().stream().map(byVolume::get).toList();
      subjects.add(
          new BalanceSubject(
              envelope.name(),
              envelope.label(),
              true,
              Set.copyOf(envelope.volumes()),
              identities.containsAll(envelope.volumes()) ? Check.IDENTITY : Check.CONSERVATION,
              scaled(envelope.tolerances(), scales),
              members.stream().flatMap(m -> m.unproved().stream()).findFirst(),
              members.stream().anyMatch(SurfaceAudit::bounded)
                  ? Optional.empty()
                  : members.get(0).noRegion()));
    }
    return subjects;
  }

  /** The tolerances with the absolute one in the rate unit. */
  static Tolerances scaled(Tolerances stated, Scales scales) {
    return new Tolerances(
        stated.absolute().isPresent()
            ? OptionalDouble.of(scales.rate() * stated.absolute().getAsDouble())
            : OptionalDouble.empty(),
        stated.relative(),
        stated.coverage());
  }
}
