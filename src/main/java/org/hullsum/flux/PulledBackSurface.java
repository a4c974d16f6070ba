package org.hullsum.flux;

import java.util.List;
import org.hullsum.geometry.Surface;

/**
 * A surface made ready for integration: tangents derived, the trim expressed in u and v.
 *
 * <p>Made once for a patch and shared by all its integrals. Immutable and thread-safe.
 */
public final class PulledBackSurface {
  private final Surface surface;
  private final List<PulledBackChart> charts;

  private PulledBackSurface(Surface surface) {
    this.surface = surface;
    this.charts =
        surface.charts().stream().map(c -> PulledBackChart.of(c, surface.trim())).toList();
  }

  public static PulledBackSurface of(Surface surface) {
    return new PulledBackSurface(surface);
  }

  public Surface surface() {
    return surface;
  }

  List<PulledBackChart> charts() {
    return charts;
  }
}
