package benchtrue.cli;

public final class Main {
    private Main() {}

    public static void main(String[] args) {}
}
