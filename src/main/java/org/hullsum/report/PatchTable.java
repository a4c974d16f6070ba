package org.hullsum.report;

import java.util.ArrayList;
import java.util.List;
import org.hullsum.audit.PatchResult;

/** Patches with their fluxes from the volume they leave to the one they enter. */
final class PatchTable {
  private static final TextTableBuilder.Align RIGHT = TextTableBuilder.Align.RIGHT;

  private PatchTable() {}

  static List<String> lines(String lengthUnit, List<PatchResult> patches) {
    FigureColumnBuilder column = new FigureColumnBuilder();
    List<List<String>> rows = new ArrayList<>();
    for (PatchResult patch : patches) {
      for (PatchResult.Flux flux : patch.fluxes()) {
        column.add(flux.value(), flux.numericalError(), flux.standardUncertainty());
        rows.add(
            List.of(
                patch.name(),
                Figures.optional(patch.area()),
                flux.at().map(Figures::quoted).orElse("-"),
                flux.unit(),
                flux.value().isPresent() ? Figures.error(flux.numericalError()) : "-",
                flux.value().isPresent() ? Figures.error(flux.standardUncertainty()) : "-",
                flux.basis()));
      }
    }
    TextTableBuilder table =
        new TextTableBuilder()
            .column("patch", TextTableBuilder.Align.LEFT)
            .column(lengthUnit.equals("1") ? "area" : "area, " + lengthUnit + "2", RIGHT)
            .column("at, s", RIGHT)
            .column("flux", RIGHT)
            .column("unit", TextTableBuilder.Align.LEFT)
            .column("error bound", RIGHT)
            .column("std. uncertainty", RIGHT)
            .column("known by", TextTableBuilder.Align.LEFT);
    List<String> figures = column.cells();
    for (int i = 0; i < rows.size(); i++) {
      List<String> row = new ArrayList<>(rows.get(i));
      row.add(3, figures.get(i));
      table.row(row);
    }
    return table.lines();
  }
}
