package nearworld.app.keys;

import com.google.crypto.tink.Aead;
import com.google.crypto.tink.InsecureSecretKeyAccess;
import com.google.crypto.tink.KeysetHandle;
import com.google.crypto.tink.RegistryConfiguration;
import com.google.crypto.tink.TinkJsonProtoKeysetFormat;
import com.google.crypto.tink.TinkProtoKeysetFormat;
import com.google.crypto.tink.aead.AeadConfig;
import com.google.crypto.tink.aead.PredefinedAeadParameters;
import com.google.crypto.tink.prf.PredefinedPrfParameters;
import com.google.crypto.tink.prf.PrfConfig;
import com.google.crypto.tink.prf.PrfSet;
import java.nio.charset.StandardCharsets;
import java.security.GeneralSecurityException;
import java.util.UUID;
import tools.jackson.core.JacksonException;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;
import tools.jackson.databind.node.ObjectNode;

/** What wraps the keys of cases and makes blind indexes. Its text form is secret. */
final class MasterKey {
    private static final JsonMapper MAPPER = JsonMapper.shared();
    private static final int INDEX_BYTES = 16;

    private final KeysetHandle wrapping;
    private final KeysetHandle indexing;
    private final Aead wrapper;
    private final PrfSet indexer;

    private MasterKey(KeysetHandle wrapping, KeysetHandle indexing) throws GeneralSecurityException {
        this.wrapping = wrapping;
        this.indexing = indexing;
        this.wrapper = wrapping.getPrimitive(RegistryConfiguration.get(), Aead.class);
        this.indexer = indexing.getPrimitive(RegistryConfiguration.get(), PrfSet.class);
    }

    /** A new random master key. */
    static MasterKey random() {
        try {
            register();
            return new MasterKey(
                    KeysetHandle.generateNew(PredefinedAeadParameters.AES256_GCM),
                    KeysetHandle.generateNew(PredefinedPrfParameters.HMAC_SHA256_PRF));
        } catch (GeneralSecurityException e) {
            throw new IllegalStateException("no master key can be made", e);
        }
    }

    /** The master key of that text form. */
    static MasterKey parse(String text) throws GeneralSecurityException {
        register();
        try {
            JsonNode node = MAPPER.readTree(text);
            return new MasterKey(keyset(node, "wrapping"), keyset(node, "indexing"));
        } catch (JacksonException e) {
            throw new GeneralSecurityException("it is no JSON");
        }
    }

    private static KeysetHandle keyset(JsonNode node, String name) throws GeneralSecurityException {
        return TinkJsonProtoKeysetFormat.parseKeyset(node.path(name).toString(), InsecureSecretKeyAccess.get());
    }

    private static void register() throws GeneralSecurityException {
        AeadConfig.register();
        PrfConfig.register();
    }

    /** The secret text form. */
    String toText() {
        try {
            ObjectNode node = MAPPER.createObjectNode();
            node.set("wrapping", MAPPER.readTree(serialized(wrapping)));
            node.set("indexing", MAPPER.readTree(serialized(indexing)));
            return node.toString();
        } catch (GeneralSecurityException e) {
            throw new IllegalStateException("the master key cannot be written", e);
        }
    }

    private static String serialized(KeysetHandle handle) throws GeneralSecurityException {
        return TinkJsonProtoKeysetFormat.serializeKeyset(handle, InsecureSecretKeyAccess.get());
    }

    /** A new key for a case, wrapped. */
    byte[] newWrappedKey(UUID id) {
        try {
            KeysetHandle handle = KeysetHandle.generateNew(PredefinedAeadParameters.AES256_GCM);
            return TinkProtoKeysetFormat.serializeEncryptedKeyset(handle, wrapper, bytes(id));
        } catch (GeneralSecurityException e) {
            throw new IllegalStateException("no key can be made for a case", e);
        }
    }

    /** The wrapped key, ready for use. */
    CaseKey unwrap(UUID id, byte[] wrapped) throws GeneralSecurityException {
        KeysetHandle handle = TinkProtoKeysetFormat.parseEncryptedKeyset(wrapped, wrapper, bytes(id));
        return new CaseKey(id, handle.getPrimitive(RegistryConfiguration.get(), Aead.class));
    }

    /** A keyed checksum, the same for the same text, that tells nothing to whoever lacks the key. */
    byte[] blindIndex(String text) {
        try {
            return indexer.computePrimary(text.getBytes(StandardCharsets.UTF_8), INDEX_BYTES);
        } catch (GeneralSecurityException e) {
            throw new IllegalStateException("no blind index can be computed", e);
        }
    }

    private static byte[] bytes(UUID id) {
        return id.toString().getBytes(StandardCharsets.UTF_8);
    }
}
