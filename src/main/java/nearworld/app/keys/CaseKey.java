package nearworld.app.keys;

import com.google.crypto.tink.Aead;
import java.nio.charset.StandardCharsets;
import java.security.GeneralSecurityException;
import java.util.UUID;

/**
 * The key of one case, ready for use. A ciphertext is bound to the case's key and to the purpose that it was sealed
 * for: moved to another place it does not open.
 */
public final class CaseKey {
    private final UUID id;
    private final Aead aead;

    CaseKey(UUID id, Aead aead) {
        this.id = id;
        this.aead = aead;
    }

    /** Encrypts a text (AES-256-GCM, a fresh random nonce each time). */
    public byte[] seal(String text, String purpose) {
        try {
            return aead.encrypt(text.getBytes(StandardCharsets.UTF_8), context(purpose));
        } catch (GeneralSecurityException e) {
            throw new IllegalStateException("a text for " + purpose + " cannot be encrypted", e);
        }
    }

    /** Decrypts what was sealed for the same purpose. */
    public String open(byte[] ciphertext, String purpose) {
        try {
            return new String(aead.decrypt(ciphertext, context(purpose)), StandardCharsets.UTF_8);
        } catch (GeneralSecurityException e) {
            throw new IllegalStateException("what is stored for " + purpose + " does not open with the case's key", e);
        }
    }

    private byte[] context(String purpose) {
        return (id + ":" + purpose).getBytes(StandardCharsets.UTF_8);
    }
}
