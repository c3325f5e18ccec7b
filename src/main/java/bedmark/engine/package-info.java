/**
 * The engine: a pure function from a loading zone and a site's settings to an assessment. SI doubles inside (m, s,
 * kg, N, W, rad); knows no unit, no document, no clock, no locale. {@link bedmark.engine.Engine} is the way in.
 * The packages below hold the formulas: {@code bed} the bed between the boards, {@code flow} areas and flows,
 * {@code drag} one class per published method, {@code seal} the seals, {@code uncertainty} the propagation,
 * {@code verdict} limits, findings and remedies. None of them knows this package.
 *
 * <p>Marks of sources: S1…S12 read, R recalled from the standard and not read again, C common practice, A an
 * assumption that a site may change, D derived.
 */
package bedmark.engine;
