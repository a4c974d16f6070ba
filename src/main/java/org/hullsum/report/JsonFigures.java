package org.hullsum.report;

import java.io.IOException;
import java.util.List;
import java.util.Optional;
import org.hullsum.audit.BalanceResult;
import org.hullsum.audit.Explanation;
import org.hullsum.audit.PatchResult;
import org.hullsum.audit.PatchResult.FoundFacing;
import org.hullsum.audit.SurfaceResult;
import org.hullsum.model.TraverseReadings;

/** The parts of the result document that carry the figures of a case. */
final class JsonFigures {
  private JsonFigures() {}

  static void writeBalances(JsonDocument json, List<BalanceResult> balances) throws IOException {
    json.beginArray("balances");
    for (BalanceResult balance : balances) {
      writeBalance(json, balance);
    }
    json.endArray();
  }

  private static void writeBalance(JsonDocument json, BalanceResult balance) throws IOException {
    json.beginObject();
    json.text("volume", balance.volume());
    json.flag("envelope", balance.envelope());
    json.text("quantity", balance.quantity());
    json.text("unit", balance.unit());
    json.optionalNumber("at", balance.at());
    if (balance.over().isPresent()) {
      BalanceResult.Interval over = balance.over().get();
      json.numbers("over", List.of(over.begin(), over.end()));
    } else {
      json.absent("over");
    }
    json.text("check", balance.check().word());
    json.optionalNumber("outward", balance.outward());
    json.optionalNumber("interior", balance.interior());
    json.optionalNumber("residual", balance.residual());
    json.beginArray("terms");
    for (BalanceResult.Term term : balance.terms()) {
      json.beginObject();
      writeTerm(json, term);
      json.endObject();
    }
    json.endArray();
    json.number("throughput", balance.throughput());
    json.text("rule", balance.rule().word());
    json.optionalNumber("tolerance", balance.tolerance());
    json.optionalNumber("numericalError", balance.numericalError());
    json.number("standardUncertainty", balance.standardUncertainty());
    json.number("coverageFactor", balance.coverageFactor());
    json.optionalNumber("detectable", balance.detectable());
    json.optionalNumber("probabilityWrong", balance.probabilityWrong());
    writeBudget(json, balance.budget());
    writeClosing(json, balance.closedBy());
    if (balance.divergence().isPresent()) {
      json.beginObject("divergence");
      writeTerm(json, balance.divergence().get());
      json.endObject();
    } else {
      json.absent("divergence");
    }
    json.text("verdict", balance.verdict().word());
    json.text("reason", balance.reason());
    json.endObject();
  }

  private static void writeTerm(JsonDocument json, BalanceResult.Term term) throws IOException {
    json.text("kind", term.kind());
    json.optionalNumber("value", term.value());
    json.optionalNumber("numericalError", term.numericalError());
    json.number("standardUncertainty", term.standardUncertainty());
    json.text("route", term.route());
    json.optionalText("formula", term.formula());
  }

  private static void writeBudget(JsonDocument json, List<BalanceResult.Contribution> budget)
      throws IOException {
    json.beginArray("budget");
    for (BalanceResult.Contribution contribution : budget) {
      json.beginObject();
      json.text("source", contribution.source());
      json.number("contribution", contribution.contribution());
      json.number("share", contribution.share());
      json.endObject();
    }
    json.endArray();
  }

  private static void writeClosing(JsonDocument json, Optional<BalanceResult.Closing> closing)
      throws IOException {
    if (closing.isPresent()) {
      json.beginObject("closedBy");
      json.text("patch", closing.get().patch());
      json.number("value", closing.get().value());
      json.endObject();
    } else {
      json.absent("closedBy");
    }
  }

  static void writePatches(JsonDocument json, List<PatchResult> patches) throws IOException {
    json.beginArray("patches");
    for (PatchResult patch : patches) {
      json.beginObject();
      json.text("name", patch.name());
      json.text("leaves", patch.leaves());
      json.text("enters", patch.enters());
      json.optionalNumber("area", patch.area());
      json.optionalVector("vectorArea", patch.vectorArea());
      json.beginArray("fluxes");
      for (PatchResult.Flux flux : patch.fluxes()) {
        json.beginObject();
        json.text("quantity", flux.quantity());
        json.text("unit", flux.unit());
        json.optionalNumber("at", flux.at());
        json.optionalNumber("value", flux.value());
        json.number("numericalError", flux.numericalError());
        json.number("standardUncertainty", flux.standardUncertainty());
        json.count("evaluations", flux.evaluations());
        json.text("basis", flux.basis());
        json.endObject();
      }
      json.endArray();
      writeTraverses(json, patch.traverses());
      json.beginObject("facing");
      json.text("declared", patch.declaredFacing());
      json.optionalText("found", patch.foundFacing().map(FoundFacing::word));
      json.optionalText("reason", patch.facingReason());
      json.endObject();
      json.endObject();
    }
    json.endArray();
  }

  private static void writeTraverses(JsonDocument json, List<TraverseReadings> traverses)
      throws IOException {
    json.beginArray("traverses");
    for (TraverseReadings traverse : traverses) {
      json.beginObject();
      json.text("rule", traverse.rule());
      json.text("section", traverse.round() ? "disk" : "rectangle");
      json.text("unit", traverse.unit());
      json.number("mean", traverse.mean());
      json.number("largest", traverse.largest());
      json.optionalNumber("largestToMean", traverse.largestToMean());
      json.optionalNumber("variation", traverse.variation());
      json.optionalNumber("swirl", traverse.swirl());
      json.beginArray("readings");
      for (TraverseReadings.Reading reading : traverse.readings()) {
        json.beginObject();
        json.numbers("at", List.of(reading.first(), reading.second()));
        json.number("speed", reading.speed());
        json.number("weight", reading.weight());
        json.endObject();
      }
      json.endArray();
      json.endObject();
    }
    json.endArray();
  }

  static void writeSurfaces(JsonDocument json, List<SurfaceResult> surfaces) throws IOException {
    json.beginArray("surfaces");
    for (SurfaceResult surface : surfaces) {
      json.beginObject();
      json.text("volume", surface.volume());
      if (surface.closed().isPresent()) {
        json.flag("closed", surface.closed().get());
      } else {
        json.absent("closed");
      }
      json.optionalText("reason", surface.reason());
      if (surface.shells().isPresent()) {
        json.count("shells", surface.shells().get());
      } else {
        json.absent("shells");
      }
      json.optionalVector("closureVector", surface.closureVector());
      json.optionalNumber("enclosedVolume", surface.enclosedVolume());
      if (surface.moments().isPresent()) {
        json.numbers("moments", surface.moments().get());
      } else {
        json.absent("moments");
      }
      writeGaps(json, surface.gaps());
      json.endObject();
    }
    json.endArray();
  }

  private static void writeGaps(JsonDocument json, List<SurfaceResult.Gap> gaps)
      throws IOException {
    json.beginArray("gaps");
    for (SurfaceResult.Gap gap : gaps) {
      json.beginObject();
      json.texts("between", gap.between());
      json.number("length", gap.length());
      json.optionalVector("centre", Optional.of(gap.centre()));
      json.number("area", gap.area());
      json.optionalNumber("fluxThrough", gap.fluxThrough());
      json.endObject();
    }
    json.endArray();
  }

  static void writeExplanations(JsonDocument json, List<Explanation> explanations)
      throws IOException {
    json.beginArray("explanations");
    for (Explanation explanation : explanations) {
      json.beginObject();
      json.text("kind", explanation.kind().word());
      json.text("balance", explanation.balance());
      json.texts("on", explanation.on());
      json.optionalNumber("factor", explanation.factor());
      json.optionalNumber("residualNow", explanation.residualNow());
      json.number("residualThen", explanation.residualThen());
      json.number("explained", explanation.explained());
      json.flag("fits", explanation.fits());
      json.counts("tiedWith", explanation.tiedWith());
      json.text("message", explanation.message());
      json.endObject();
    }
    json.endArray();
  }
}
