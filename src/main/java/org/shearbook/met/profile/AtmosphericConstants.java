package org.shearbook.met.profile;

/**
 * The one set of physical constants of the house, SI. Tables and papers that use slightly other values differ
 * from us in the fourth digit; a test that compares with one says which set it used.
 */
public final class AtmosphericConstants {

    /** Gas constant of dry air R [J kg⁻¹ K⁻¹], the value of ISO 2533:1975. */
    public static final double GAS_CONSTANT_DRY_AIR = 287.05287;

    /** κ = R / c_p of dry air [1]. */
    public static final double KAPPA = 2.0 / 7.0;

    /** Ratio ε of the molar masses of water and dry air [1]. */
    public static final double EPSILON = 0.622;

    /** Standard acceleration of free fall g [m s⁻²]; with it a geopotential metre is a metre. */
    public static final double GRAVITY = 9.80665;

    /** 0 °C [K]. */
    public static final double ZERO_CELSIUS = 273.15;

    /** Reference pressure of the potential temperature [Pa]. */
    public static final double REFERENCE_PRESSURE = 100_000;

    private AtmosphericConstants() {
    }
}
