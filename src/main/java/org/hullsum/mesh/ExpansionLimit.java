package org.hullsum.mesh;

/**
 * Refuses packed data that unpack to far more than any mesh would: more than {@link #RATIO} times
 * what was packed once {@link #ALWAYS} bytes are exceeded, or more than {@link #MOST} bytes in all.
 * Points and triangles as text or in binary shrink to between a half and a fiftieth; the smallest
 * files, whose arrays may be all alike, get by through the allowance.
 */
final class ExpansionLimit {
  /** Bytes that any file may unpack to. */
  static final long ALWAYS = 16L << 20;

  /** How many times its packed size a file may unpack to, beyond that. */
  static final long RATIO = 200;

  /** Bytes that no file may exceed: ten million triangles as text take about a tenth of it. */
  static final long MOST = 32L << 30;

  private long packed;
  private long unpacked;

  /** Counts bytes that have been unpacked. */
  void count(long morePacked, long moreUnpacked) throws PackedFault {
    packed += morePacked;
    unpacked += moreUnpacked;
    if (unpacked > MOST || unpacked > ALWAYS + RATIO * packed) {
      throw new PackedFault(
          packed + " packed bytes unpack to " + unpacked + " and more, which no mesh would");
    }
  }
}
