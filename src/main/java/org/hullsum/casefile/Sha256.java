package org.hullsum.casefile;

import java.nio.ByteBuffer;
import java.util.HexFormat;

/**
 * The SHA-256 digest of a file's bytes, as printed beside the results.
 *
 * <p>Written out because the first use of the platform's own digests loads all its security
 * providers: twenty milliseconds, a tenth of a small audit. Thread-safe; O(length).
 *
 * <p>Reference: FIPS PUB 180-4, Secure Hash Standard, 2015, sections 4.1.2, 4.2.2, 5 and 6.2.
 */
final class Sha256 {
  private static final int BLOCK = 64;
  private static final int ROUNDS = 64;

  /** Eight bytes of length and one of padding at least end the message. */
  private static final int LEAST_PADDING = 9;

  private static final int[] PRIMES = primes();
  private static final int[] CONSTANTS = constants();

  private Sha256() {}

  private static int[] primes() {
    int[] primes = new int[ROUNDS];
    int count = 0;
    for (int candidate = 2; count < ROUNDS; candidate++) {
      boolean prime = true;
      for (int i = 0; i < count && prime; i++) {
        prime = candidate % primes[i] != 0;
      }
      if (prime) {
        primes[count++] = candidate;
      }
    }
    return primes;
  }

  /** First 32 bits of the fractional parts of the cube roots of the first 64 primes. */
  private static int[] constants() {
    int[] constants = new int[ROUNDS];
    for (int i = 0; i < ROUNDS; i++) {
      constants[i] = fraction(Math.cbrt(PRIMES[i]));
    }
    return constants;
  }

  /** The first 32 bits of the fractional part: a root below 20 leaves a double 47 bits of it. */
  private static int fraction(double root) {
    return (int) (long) ((root - Math.floor(root)) * (1L << 32));
  }

  /** In lower-case hexadecimal. */
  static String of(byte[] message) {
    ByteBuffer padded = ByteBuffer.allocate(paddedLength(message.length));
    padded.put(message).put((byte) 0x80);
    padded.putLong(padded.capacity() - Long.BYTES, 8L * message.length);
    padded.rewind();
    int[] hash = new int[8];
    for (int i = 0; i < hash.length; i++) {
      hash[i] = fraction(Math.sqrt(PRIMES[i]));
    }
    int[] schedule = new int[ROUNDS];
    while (padded.hasRemaining()) {
      block(padded, schedule, hash);
    }
    ByteBuffer digest = ByteBuffer.allocate(Integer.BYTES * hash.length);
    for (int word : hash) {
      digest.putInt(word);
    }
    return HexFormat.of().formatHex(digest.array());
  }

  private static int paddedLength(int length) {
    return (length + LEAST_PADDING + BLOCK - 1) / BLOCK * BLOCK;
  }

  private static void block(ByteBuffer message, int[] w, int[] hash) {
    for (int t = 0; t < 16; t++) {
      w[t] = message.getInt();
    }
    for (int t = 16; t < ROUNDS; t++) {
      int a = w[t - 15];
      int b = w[t - 2];
      int s0 = Integer.rotateRight(a, 7) ^ Integer.rotateRight(a, 18) ^ a >>> 3;
      int s1 = Integer.rotateRight(b, 17) ^ Integer.rotateRight(b, 19) ^ b >>> 10;
      w[t] = w[t - 16] + s0 + w[t - 7] + s1;
    }
    int[] v = hash.clone();
    for (int t = 0; t < ROUNDS; t++) {
      int e = v[4];
      int s1 = Integer.rotateRight(e, 6) ^ Integer.rotateRight(e, 11) ^ Integer.rotateRight(e, 25);
      int chosen = e & v[5] ^ ~e & v[6];
      int first = v[7] + s1 + chosen + CONSTANTS[t] + w[t];
      int a = v[0];
      int s0 = Integer.rotateRight(a, 2) ^ Integer.rotateRight(a, 13) ^ Integer.rotateRight(a, 22);
      int majority = a & v[1] ^ a & v[2] ^ v[1] & v[2];
      System.arraycopy(v, 0, v, 1, 7);
      v[4] += first;
      v[0] = first + s0 + majority;
    }
    for (int i = 0; i < hash.length; i++) {
      hash[i] += v[i];
    }
  }
}
