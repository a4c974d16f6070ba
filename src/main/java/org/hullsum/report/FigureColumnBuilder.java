package org.hullsum.report;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * A column of figures of one unit, aligned at the decimal point.
 *
 * <p>Each figure has as many decimals as its own error supports: down to the leading digit of a
 * numerical error bound, one further for a measured figure; an exact one as many as it needs. No
 * figure has more than {@link Figures#MOST_DIGITS} digits counted from the leading digit of the
 * largest in the column. A figure that would print as zero although it stands out of its error is
 * written with a power of ten instead.
 *
 * <p>A column is built by {@link #add} and read once by {@link #cells}.
 */
final class FigureColumnBuilder {
  private static final int DIGITS_OF_SMALL = 3;

  private record Entry(Optional<Double> value, double bound, double uncertainty) {
    double error() {
      return bound + uncertainty;
    }
  }

  private final List<Entry> entries = new ArrayList<>();

  /**
   * Adds a figure.
   *
   * @param value empty for a dash
   * @param bound its numerical error bound; infinite where none is known
   * @param uncertainty its standard uncertainty
   */
  FigureColumnBuilder add(Optional<Double> value, double bound, double uncertainty) {
    entries.add(new Entry(value.filter(Double::isFinite), bound, uncertainty));
    return this;
  }

  /** The figures as texts of one width, in the order in which they were added. */
  List<String> cells() {
    double largest =
        entries.stream().flatMap(e -> e.value().stream()).mapToDouble(Math::abs).max().orElse(0);
    boolean plain = Figures.isPlain(largest);
    int most = largest == 0 ? 0 : Figures.MOST_DIGITS - 1 - Figures.exponent(largest);
    List<String> texts = new ArrayList<>();
    for (Entry entry : entries) {
      texts.add(
          entry.value().isEmpty()
              ? "-"
              : plain ? plain(entry, Math.max(0, most)) : withPower(entry, most));
    }
    return aligned(texts);
  }

  private static String plain(Entry entry, int most) {
    double value = entry.value().orElseThrow();
    BigDecimal rounded =
        new BigDecimal(value).setScale(decimals(entry, most), RoundingMode.HALF_EVEN);
    if (rounded.signum() == 0 && Math.abs(value) > entry.error()) {
      return Figures.significant(value, DIGITS_OF_SMALL);
    }
    return Figures.plain(entry.error() == 0 ? withoutZeros(rounded) : rounded);
  }

  private static String withPower(Entry entry, int most) {
    double value = entry.value().orElseThrow();
    if (value == 0) {
      return "0";
    }
    int digits = Figures.exponent(value) + decimals(entry, most) + 1;
    BigDecimal rounded =
        new BigDecimal(value)
            .round(
                new MathContext(
                    Math.min(Math.max(digits, 1), Figures.MOST_DIGITS), RoundingMode.HALF_EVEN));
    return Figures.scientific(entry.error() == 0 ? rounded.stripTrailingZeros() : rounded);
  }

  /** Decimals (negative: places before the point) that the error supports, at most {@code most}. */
  private static int decimals(Entry entry, int most) {
    double error = entry.error();
    if (error == 0 || !Double.isFinite(error)) {
      return most;
    }
    int supported = -Figures.exponent(error) + (entry.uncertainty() > entry.bound() ? 1 : 0);
    return most >= 0 ? Math.min(most, Math.max(supported, 0)) : Math.min(most, supported);
  }

  private static BigDecimal withoutZeros(BigDecimal value) {
    BigDecimal stripped = value.stripTrailingZeros();
    return stripped.scale() < 0 ? stripped.setScale(0) : stripped;
  }

  private static List<String> aligned(List<String> texts) {
    int before = texts.stream().mapToInt(FigureColumnBuilder::point).max().orElse(0);
    int after = texts.stream().mapToInt(t -> t.length() - point(t)).max().orElse(0);
    return texts.stream()
        .map(t -> " ".repeat(before - point(t)) + t + " ".repeat(after - t.length() + point(t)))
        .toList();
  }

  /** Where the point stands, or would stand after the whole digits. */
  private static int point(String text) {
    int end = text.indexOf('.');
    return end >= 0 ? end : text.indexOf('e') >= 0 ? text.indexOf('e') : text.length();
  }
}
