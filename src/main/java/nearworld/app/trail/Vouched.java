package nearworld.app.trail;

import org.jspecify.annotations.Nullable;

/** What entries of one action vouch for: a feature that stores things by their checksums checks them when asked. */
public interface Vouched {
    /** The action whose entries vouch. */
    String action();

    /** A code for what is wrong with the thing that the entry vouches for; null where it is unchanged. */
    @Nullable
    String faultOf(TrailEntryView entry);

    /** How many things are stored; there is one entry for each. */
    long stored();
}
