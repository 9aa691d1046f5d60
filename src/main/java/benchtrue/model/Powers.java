package benchtrue.model;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;

/**
 * A product of powers Π kᵉ with rational exponents, none of them 0. Immutable; equal whatever the order, which is kept for
 * printing.
 */
final class Powers<K> {
    private final Map<K, Ratio> exponents;

    private Powers(Map<K, Ratio> exponents) {
        this.exponents = Collections.unmodifiableMap(exponents);
    }

    static <K> Powers<K> none() {
        return new Powers<>(new LinkedHashMap<>());
    }

    static <K> Powers<K> of(K key) {
        return Powers.<K>none().with(key, Ratio.ONE);
    }

    Map<K, Ratio> exponents() {
        return exponents;
    }

    boolean isEmpty() {
        return exponents.isEmpty();
    }

    Ratio exponent(K key) {
        return exponents.getOrDefault(key, Ratio.ZERO);
    }

    /** Times keyᵉ. */
    Powers<K> with(K key, Ratio exponent) {
        Map<K, Ratio> product = new LinkedHashMap<>(exponents);
        multiply(product, key, exponent);
        return new Powers<>(product);
    }

    Powers<K> without(K key) {
        Map<K, Ratio> rest = new LinkedHashMap<>(exponents);
        rest.remove(key);
        return new Powers<>(rest);
    }

    Powers<K> times(Powers<K> other) {
        Map<K, Ratio> product = new LinkedHashMap<>(exponents);
        other.exponents.forEach((key, exponent) -> multiply(product, key, exponent));
        return new Powers<>(product);
    }

    Powers<K> power(Ratio exponent) {
        Map<K, Ratio> power = new LinkedHashMap<>();
        exponents.forEach((key, old) -> multiply(power, key, old.times(exponent)));
        return new Powers<>(power);
    }

    private static <K> void multiply(Map<K, Ratio> product, K key, Ratio exponent) {
        Ratio sum = product.getOrDefault(key, Ratio.ZERO).plus(exponent);
        if (sum.equals(Ratio.ZERO)) {
            product.remove(key);
        } else {
            product.put(key, sum);
        }
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Powers<?> powers && exponents.equals(powers.exponents);
    }

    @Override
    public int hashCode() {
        return exponents.hashCode();
    }
}
