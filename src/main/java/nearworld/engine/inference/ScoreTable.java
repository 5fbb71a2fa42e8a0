package nearworld.engine.inference;

import org.jspecify.annotations.Nullable;

/** A measure over the score for each state of some variables: what summing the others out has left. */
record ScoreTable(int[] scope, int[] cards, @Nullable ScoreMeasure[] entries) {

    /** The entry for the states of all variables, of which those of the scope are read; null: impossible. */
    @Nullable
    ScoreMeasure at(int[] stateOfVariable) {
        int index = 0;
        for (int i = 0; i < scope.length; i++) {
            index = index * cards[i] + stateOfVariable[scope[i]];
        }
        return entries[index];
    }
}
