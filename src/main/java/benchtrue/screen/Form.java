package benchtrue.screen;

import java.util.ArrayList;
import java.util.List;
import java.util.function.Function;

/** A few questions, answered one after the other in the last row; then something is done with the answers. */
final class Form {
    private static final int LONGEST = 400;

    private final String title;
    private final List<String> questions;
    private final Function<List<String>, String> done;
    private final List<String> answers = new ArrayList<>();
    private final StringBuilder typed = new StringBuilder();
    private String problem = "";

    /** @param done takes one answer for each question; returns what is wrong with them, or nothing */
    Form(String title, List<String> questions, Function<List<String>, String> done) {
        this.title = title;
        this.questions = questions;
        this.done = done;
    }

    void type(char c) {
        if (typed.length() < LONGEST) {
            typed.append(c);
        }
        problem = "";
    }

    void rubOut() {
        typed.setLength(Math.max(0, typed.length() - 1));
        problem = "";
    }

    /** Whether the form is done with; where an answer was wrong it begins again. */
    boolean enter() {
        answers.add(typed.toString().strip());
        if (answers.size() < questions.size()) {
            typed.setLength(0);
            return false;
        }
        problem = done.apply(List.copyOf(answers));
        if (problem.isEmpty()) {
            return true;
        }
        answers.clear();
        typed.setLength(0);
        return false;
    }

    String title() {
        return title + (problem.isEmpty() ? "" : "  " + problem);
    }

    /** The question with what has been typed so far. */
    String prompt() {
        return questions.get(answers.size()) + ": " + typed;
    }
}
