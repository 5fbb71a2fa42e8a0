package nearworld.cli;

import nearworld.exchange.documents.YamlText;
import nearworld.exchange.faults.Place;
import nearworld.exchange.packs.PackReader;

/** Where the pack's file has a path, for what the calculation finds wrong with the pack. */
record PackPlaces(String file, byte[] bytes) {
    /** True for paths of a pack that no case has. */
    static boolean isOfPack(String path) {
        return path.startsWith("$.conditions") || path.startsWith("$.events");
    }

    Place of(String path) {
        return YamlText.read(bytes, PackReader.MOST_BYTES).faults().placeOf(path);
    }
}
