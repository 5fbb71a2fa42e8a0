package nearworld.engine.basics;

import java.util.List;

/**
 * A published quantity given at some ages, interpolated between them and flat beyond the ends.
 *
 * <p>Prevalences and probabilities run linearly in the logit, rates and shares linearly in the logarithm.
 */
public final class AgeCurve {
    /** The scale on which the curve is a straight line between two ages. */
    public enum Scale {
        LOGIT,
        LOG
    }

    private final Scale scale;
    private final double[] ages;
    private final List<Estimate> values;
    private final double[] transformed;

    private AgeCurve(Scale scale, double[] ages, List<Estimate> values) {
        if (ages.length == 0 || ages.length != values.size()) {
            throw new IllegalArgumentException(
                    "ages and values must match, are " + ages.length + " and " + values.size());
        }
        this.scale = scale;
        this.ages = ages.clone();
        this.values = List.copyOf(values);
        this.transformed = new double[ages.length];
        for (int i = 0; i < ages.length; i++) {
            if (i > 0 && !(ages[i] > ages[i - 1])) {
                throw new IllegalArgumentException("ages must rise, found " + ages[i] + " after " + ages[i - 1]);
            }
            transformed[i] = forward(values.get(i).value());
        }
    }

    /**
     * @param ages rising, in years
     * @param values within (0, 1) for {@code LOGIT}, above 0 for {@code LOG}
     */
    public static AgeCurve of(Scale scale, double[] ages, List<Estimate> values) {
        return new AgeCurve(scale, ages, values);
    }

    /** The same value at every age. */
    public static AgeCurve constant(Scale scale, Estimate value) {
        return new AgeCurve(scale, new double[] {0}, List.of(value));
    }

    /** The value at an exact age in years. */
    public double at(double age) {
        return backward(transformedAt(age));
    }

    private double transformedAt(double age) {
        int last = ages.length - 1;
        if (age <= ages[0]) {
            return transformed[0];
        }
        if (age >= ages[last]) {
            return transformed[last];
        }
        int i = 1;
        while (ages[i] < age) {
            i++;
        }
        double w = (age - ages[i - 1]) / (ages[i] - ages[i - 1]);
        return transformed[i - 1] + w * (transformed[i] - transformed[i - 1]);
    }

    /**
     * The integral over ages of a rate (scale {@code LOG}): each stretch between two given ages is an exponential, so
     * that ∫ = (r₂ − r₁)·Δ / ln(r₂/r₁), exactly.
     */
    public double integral(double fromAge, double toAge) {
        if (scale != Scale.LOG) {
            throw new IllegalArgumentException("only a rate is integrated, scale is " + scale);
        }
        double sum = 0;
        double a = fromAge;
        for (int i = 0; a < toAge; i++) {
            double b = i < ages.length ? Math.min(Math.max(ages[i], a), toAge) : toAge;
            if (b > a) {
                double la = transformedAt(a);
                double step = transformedAt(b) - la;
                double mean = Math.abs(step) < 1e-5 ? 1 + step / 2 + step * step / 6 : StrictMath.expm1(step) / step;
                sum += StrictMath.exp(la) * mean * (b - a);
                a = b;
            }
        }
        return sum;
    }

    public Scale scale() {
        return scale;
    }

    public int size() {
        return ages.length;
    }

    public double age(int i) {
        return ages[i];
    }

    public Estimate value(int i) {
        return values.get(i);
    }

    private double forward(double v) {
        if (scale == Scale.LOGIT) {
            if (!(v > 0 && v < 1)) {
                throw new IllegalArgumentException("a probability by age must lie within (0, 1), is " + v);
            }
            return StrictMath.log(v) - StrictMath.log1p(-v);
        }
        if (!(v > 0 && v < Double.POSITIVE_INFINITY)) {
            throw new IllegalArgumentException("a rate or share by age must be above 0, is " + v);
        }
        return StrictMath.log(v);
    }

    private double backward(double t) {
        return scale == Scale.LOGIT ? 1 / (1 + StrictMath.exp(-t)) : StrictMath.exp(t);
    }
}
