package org.hullsum.audit;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.closure.OrientationSystem;
import org.hullsum.closure.Seams;
import org.hullsum.closure.Shell;
import org.hullsum.closure.VolumeFacings;
import org.hullsum.model.Volume;

/**
 * The surface of one volume, seen by itself: its patches' sides by lines, its seams, its shells.
 *
 * @param volume whose surface
 * @param patches that leave or enter it and have a surface with an area, baffles not among them, in
 *     the order of the case
 * @param bare the name of a patch without surface, where there is one
 * @param bounded whether any patch leaves or enters it
 * @param byLines the sides found by parity, none with a say of any seam
 * @param seams of the patches, by their indices
 * @param shells of the patches
 */
record SewnSurface(
    Volume volume,
    List<PatchAudit> patches,
    Optional<String> bare,
    boolean bounded,
    VolumeFacings byLines,
    Seams seams,
    List<Shell> shells) {
  SewnSurface {
    Objects.requireNonNull(volume, "volume");
    Objects.requireNonNull(bare, "bare");
    Objects.requireNonNull(byLines, "byLines");
    Objects.requireNonNull(seams, "seams");
    patches = List.copyOf(patches);
    shells = List.copyOf(shells);
  }

  /** +1 for each patch that leaves the volume, −1 for each that enters it. */
  List<Integer> leaving() {
    return patches.stream().map(p -> leaves(p) ? 1 : -1).toList();
  }

  boolean leaves(PatchAudit patch) {
    return patch.patch().leaves().equals(volume.name());
  }

  /** Its part in the joint system, the patches numbered as in the list of all. */
  OrientationSystem.Part part(List<PatchAudit> all) {
    return new OrientationSystem.Part(
        patches.stream().map(all::indexOf).toList(), leaving(), shells);
  }
}
