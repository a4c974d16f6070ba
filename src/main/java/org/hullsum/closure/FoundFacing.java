package org.hullsum.closure;

import java.util.Objects;
import java.util.Optional;

/**
 * Which way the construction normal of a patch points, seen from one volume.
 *
 * @param patch index of the patch among the surfaces
 * @param side what was found
 * @param reason why it is undetermined, present exactly then
 * @param leaning where undetermined, the side that a clear majority of the lines speaks for; good
 *     for explanations only
 * @param lines number of lines that were kept
 */
public record FoundFacing(
    int patch, Side side, Optional<Reason> reason, Optional<Side> leaning, int lines) {
  /** The side of the volume to which the construction normal points. */
  public enum Side {
    OUT,
    IN,
    UNDETERMINED;

    /** +1 for out, −1 for in. */
    public int sign() {
      return switch (this) {
        case OUT -> 1;
        case IN -> -1;
        case UNDETERMINED -> throw new IllegalStateException("an undetermined side has no sign");
      };
    }

    /** The other side; undetermined stays so. */
    public Side opposite() {
      return switch (this) {
        case OUT -> IN;
        case IN -> OUT;
        case UNDETERMINED -> UNDETERMINED;
      };
    }
  }

  /** Why no side was found. */
  public enum Reason {
    /** The two sides of a point are alike, or lines through it disagree. */
    OPEN_OR_COINCIDENT(
        "the surface around it is open, or another patch lies on part of it: both sides look alike"),
    /** Each point has a side, and not all the same. */
    POINTS_AT_ODDS(
        "its points disagree: it runs through the volume's own surface, or is not orientable"),
    /** Too few lines could be followed with certainty. */
    NO_RELIABLE_LINE("no line through it could be followed with certainty");

    private final String words;

    Reason(String words) {
      this.words = words;
    }

    /** What to say of the patch. */
    public String words() {
      return words;
    }
  }

  public FoundFacing {
    Objects.requireNonNull(side, "side");
    Objects.requireNonNull(leaning, "leaning");
    if (reason.isPresent() != (side == Side.UNDETERMINED)) {
      throw new IllegalArgumentException("a reason belongs to an undetermined side");
    }
  }

  /**
   * Whether what two volumes say of the patch between them fits: its normal points out of one and
   * into the other. Where one of them is undetermined there is nothing to contradict.
   */
  public boolean fits(FoundFacing inOtherVolume) {
    return side == Side.UNDETERMINED
        || inOtherVolume.side == Side.UNDETERMINED
        || side == inOtherVolume.side.opposite();
  }
}
