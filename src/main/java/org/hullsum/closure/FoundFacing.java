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
    /** Lines and seams contradict each other. */
    SEAMS_AT_ODDS("lines through it and the seams with its neighbours contradict each other"),
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
   * The same, with what the seams say.
   *
   * @param sign +1 where they find the construction normal to point out of the volume, −1 into it,
   *     0 where they do not tell
   */
  public FoundFacing confirmedBy(int sign) {
    if (sign == 0 || (side != Side.UNDETERMINED && side.sign() == sign)) {
      return this;
    }
    if (side == Side.UNDETERMINED && reason.filter(Reason.NO_RELIABLE_LINE::equals).isEmpty()) {
      // What lines show to be at odds no seam can mend.
      return this;
    }
    if (side == Side.UNDETERMINED) {
      return new FoundFacing(
          patch, sign > 0 ? Side.OUT : Side.IN, Optional.empty(), Optional.empty(), lines);
    }
    return new FoundFacing(
        patch, Side.UNDETERMINED, Optional.of(Reason.SEAMS_AT_ODDS), Optional.empty(), lines);
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
