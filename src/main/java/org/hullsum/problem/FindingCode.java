package org.hullsum.problem;

import java.util.Locale;

/** The kinds of findings, each with its usual severity; {@link #code} is stable. */
public enum FindingCode {
  ORIENTATION_REVERSED(Severity.ERROR),
  ORIENTATION_CONFLICT(Severity.ERROR),
  SURFACE_OPEN(Severity.ERROR),
  SURFACE_OVERLAP(Severity.ERROR),
  PATCH_DEGENERATE(Severity.ERROR),
  MESH_NOT_MANIFOLD(Severity.ERROR),
  FIELD_SINGULAR(Severity.ERROR),
  FIELD_UNDEFINED(Severity.ERROR),
  CLAIM_MISSED(Severity.ERROR),
  VOLUME_UNBOUNDED(Severity.ERROR),
  SECOND_OPINION_DIFFERS(Severity.WARNING),
  MESH_DUPLICATE_FACES(Severity.WARNING),
  MESH_SELF_INTERSECTING(Severity.WARNING),
  FIELD_DISCONTINUOUS(Severity.WARNING),
  ACCURACY_NOT_REACHED(Severity.WARNING),
  MEASUREMENT_SUSPECT(Severity.WARNING),
  CLOSES_TOO_WELL(Severity.WARNING),
  TOO_COARSE_TO_TELL(Severity.WARNING),
  WAIVER_EXPIRED(Severity.WARNING),
  MESH_WELDED(Severity.NOTE),
  MESH_CRACKED(Severity.NOTE),
  MESH_DEGENERATE_FACES(Severity.NOTE),
  FACETING_LOSS(Severity.NOTE),
  FLUX_UNKNOWN(Severity.NOTE),
  NAME_UNUSED(Severity.NOTE),
  WAIVER_UNUSED(Severity.NOTE),
  THROUGHPUT_ZERO(Severity.NOTE),
  SINGULARITY_NOT_EXCLUDED(Severity.NOTE);

  private final Severity severity;

  FindingCode(Severity severity) {
    this.severity = severity;
  }

  /** The severity it has unless the finding itself says otherwise. */
  public Severity severity() {
    return severity;
  }

  /** The code of the result document, such as {@code orientation-reversed}. */
  public String code() {
    return name().toLowerCase(Locale.ROOT).replace('_', '-');
  }
}
