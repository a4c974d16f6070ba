package org.hullsum.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.Random;
import org.junit.jupiter.api.Test;

class Sha256Test {
  private static final long SEED = 180_4;

  /** FIPS PUB 180-4's own example, from memory; confirmed by the platform's digest below. */
  @Test
  void digestOfAbcIsThatOfTheStandard() {
    assertEquals(
        "ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad",
        Sha256.of("abc".getBytes(StandardCharsets.UTF_8)));
  }

  @Test
  void digestIsThatOfThePlatformForEveryLengthAroundABlock() throws NoSuchAlgorithmException {
    Random random = new Random(SEED);
    MessageDigest platform = MessageDigest.getInstance("SHA-256");
    for (int length = 0; length < 300; length++) {
      byte[] message = new byte[length];
      random.nextBytes(message);
      assertEquals(
          HexFormat.of().formatHex(platform.digest(message)), Sha256.of(message), "of " + length);
    }
    byte[] large = new byte[1_000_003];
    random.nextBytes(large);
    assertEquals(HexFormat.of().formatHex(platform.digest(large)), Sha256.of(large));
  }
}
