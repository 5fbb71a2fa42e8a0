package nearworld.app.trail;

import java.util.List;

/** One page of the trail, newest first; pages count from 1. */
public record TrailPage(List<TrailEntryView> entries, int page, int pages, long total) {
    public TrailPage {
        entries = List.copyOf(entries);
    }
}
