package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.stream.IntStream;
import org.hullsum.closure.FacingFinder;
import org.hullsum.closure.PatchProbe;
import org.hullsum.closure.VolumeFacings;
import org.hullsum.model.Case;
import org.hullsum.model.Patch;
import org.hullsum.model.PatchSurface;
import org.hullsum.model.Volume;

/**
 * Looks along lines for the sides of the patches of each volume. It needs no integral, so it runs
 * beside them.
 */
final class LineInspection {
  private final Case audited;

  LineInspection(Case audited) {
    this.audited = audited;
  }

  /**
   * What is seen of one volume.
   *
   * @param volume whose surface
   * @param patches that leave or enter it and have a surface, baffles not among them, in the order
   *     of the case
   * @param bare the name of a patch without surface, where there is one
   * @param bounded whether any patch leaves or enters it
   * @param finder with the surfaces of those patches, by their indices
   * @param facings the sides found by parity, where no seam has a say
   */
  record Seen(
      Volume volume,
      List<Patch> patches,
      Optional<String> bare,
      boolean bounded,
      FacingFinder finder,
      VolumeFacings facings) {
    Seen {
      Objects.requireNonNull(volume, "volume");
      Objects.requireNonNull(bare, "bare");
      Objects.requireNonNull(finder, "finder");
      Objects.requireNonNull(facings, "facings");
      patches = List.copyOf(patches);
    }

    /** What is seen where some of the patches turned out to have no area, and do not count. */
    Seen without(List<String> degenerate, Map<String, Double> parameters) {
      List<Patch> left = patches.stream().filter(p -> !degenerate.contains(p.name())).toList();
      return left.size() == patches.size() ? this : of(volume, left, bare, bounded, parameters);
    }

    private static Seen of(
        Volume volume,
        List<Patch> patches,
        Optional<String> bare,
        boolean bounded,
        Map<String, Double> parameters) {
      PatchSurface.Visitor<PatchProbe> prepared = new Probes(parameters);
      FacingFinder finder =
          new FacingFinder(
              patches.stream().map(p -> p.surface().orElseThrow().accept(prepared)).toList());
      VolumeFacings facings = finder.find(IntStream.range(0, patches.size()).boxed().toList());
      return new Seen(volume, patches, bare, bounded, finder, facings);
    }
  }

  /** All volumes, in the order of the case. */
  List<Seen> look() {
    return audited.volumes().stream().map(this::look).toList();
  }

  private Seen look(Volume volume) {
    List<Patch> surfaced = new ArrayList<>();
    Optional<String> bare = Optional.empty();
    boolean bounded = false;
    for (Patch patch : audited.patches()) {
      boolean touches =
          patch.leaves().equals(volume.name()) || patch.enters().equals(volume.name());
      if (patch.isBaffle() || !touches) {
        continue;
      }
      bounded = true;
      if (patch.surface().isPresent()) {
        surfaced.add(patch);
      } else {
        bare = bare.or(() -> Optional.of(patch.name()));
      }
    }
    return Seen.of(volume, surfaced, bare, bounded, audited.inputs().values());
  }

  private static final class Probes implements PatchSurface.Visitor<PatchProbe> {
    private final Map<String, Double> parameters;

    Probes(Map<String, Double> parameters) {
      this.parameters = parameters;
    }

    @Override
    public PatchProbe formulas(PatchSurface.Formulas surface) {
      return PatchProbe.of(surface.surface(), parameters);
    }

    @Override
    public PatchProbe triangles(PatchSurface.Triangles surface) {
      return PatchProbe.of(surface.tree());
    }
  }
}
