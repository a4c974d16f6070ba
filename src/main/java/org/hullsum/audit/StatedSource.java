package org.hullsum.audit;

import org.hullsum.model.InteriorTerm;
import org.hullsum.model.Volume;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;
import org.hullsum.problem.Severity;

/**
 * Whether a volume's interior is stated as a total source and nothing in it is integrated. Then a
 * pole of the field inside is no fault: it is the source, and only the field's own divergence can't
 * be told beside the check.
 */
final class StatedSource implements InteriorTerm.Visitor<Boolean> {
  private StatedSource() {}

  static boolean in(Volume volume) {
    StatedSource stated = new StatedSource();
    return !volume.interior().isEmpty()
        && volume.interior().stream().allMatch(term -> term.accept(stated));
  }

  /** The same finding, a pole weighing less. */
  static Finding weighed(Finding finding) {
    return finding.code() == FindingCode.FIELD_SINGULAR
        ? finding.weighing(Severity.WARNING)
        : finding;
  }

  @Override
  public Boolean divergenceOf(InteriorTerm.DivergenceOf term) {
    return false;
  }

  @Override
  public Boolean generation(InteriorTerm.Generation term) {
    return true;
  }

  @Override
  public Boolean generationPerVolume(InteriorTerm.GenerationPerVolume term) {
    return false;
  }

  @Override
  public Boolean accumulation(InteriorTerm.Accumulation term) {
    return true;
  }

  @Override
  public Boolean accumulationPerVolume(InteriorTerm.AccumulationPerVolume term) {
    return false;
  }
}
