/*
 * format: probecal-table/1
 * table: oxygen-fresh
 * values: oxygen in water in equilibrium with water-saturated air, mg/L
 * equation: benson-krause-1984
 * citation: Benson, B.B., Krause, D. (1984) The concentration and isotopic fractionation of oxygen dissolved in freshwater and seawater in equilibrium with the atmosphere. Limnol. Oceanogr. 29(3), 620-632, Eq. 32
 * rows: water temperature 0 to 40 degC (ITS-90), 21 of them in steps of 2
 * columns: absolute station pressure 600 to 1100 hPa, 2 of them in steps of 500
 * salinity: 0 (fresh water)
 * air: water-saturated; mole fraction in dry air 0.20946
 * interpolation: linear between columns, then linear between rows
 * error allowed: 0.01 mg/L
 * largest error found: 0.00987 mg/L at 1 degC and 1100 hPa; 0.0641% at 1 degC and 600 hPa
 * error found over: 241 x 203 = 48923 points (nodes, both sides of each, cells with their middles), values as written, read in 32-bit numbers
 * outside the table: nothing is extrapolated or clamped
 * made by: probecal 0.1.0
 * size: 168 bytes of constant values
 */
#ifndef PROBECAL_TABLE_OXYGEN_FRESH_H
#define PROBECAL_TABLE_OXYGEN_FRESH_H

#ifndef PROBECAL_TABLE_STATUS
#define PROBECAL_TABLE_STATUS
/* What a reader answers; the value is written only with PROBECAL_TABLE_OK. */
enum probecal_table_status {
    PROBECAL_TABLE_OK = 0,
    PROBECAL_TABLE_TEMPERATURE_IS_NAN = 1,
    PROBECAL_TABLE_TEMPERATURE_BELOW = 2,
    PROBECAL_TABLE_TEMPERATURE_ABOVE = 3,
    PROBECAL_TABLE_PRESSURE_IS_NAN = 4,
    PROBECAL_TABLE_PRESSURE_BELOW = 5,
    PROBECAL_TABLE_PRESSURE_ABOVE = 6,
    PROBECAL_TABLE_SALINITY_IS_NAN = 7,
    PROBECAL_TABLE_SALINITY_BELOW = 8,
    PROBECAL_TABLE_SALINITY_ABOVE = 9
};
#endif

#define OXYGEN_FRESH_ROWS 21
#define OXYGEN_FRESH_FIRST_CELSIUS 0.0f
#define OXYGEN_FRESH_LAST_CELSIUS 40.0f
#define OXYGEN_FRESH_ROWS_PER_KELVIN 0.5f
#define OXYGEN_FRESH_COLUMNS 2
#define OXYGEN_FRESH_FIRST_HECTOPASCAL 600.0f
#define OXYGEN_FRESH_LAST_HECTOPASCAL 1100.0f
#define OXYGEN_FRESH_COLUMNS_PER_HECTOPASCAL 0.002f

static const float oxygen_fresh_values[OXYGEN_FRESH_ROWS][OXYGEN_FRESH_COLUMNS] = {
    { 8.6251f, 15.8789f },
    { 8.1532f, 15.0213f },
    { 7.7218f, 14.2386f },
    { 7.3266f, 13.5229f },
    { 6.9639f, 12.8672f },
    { 6.6300f, 12.2653f },
    { 6.3220f, 11.7118f },
    { 6.0372f, 11.2015f },
    { 5.7730f, 10.7302f },
    { 5.5273f, 10.2937f },
    { 5.2981f, 9.8887f },
    { 5.0835f, 9.5118f },
    { 4.8821f, 9.1603f },
    { 4.6922f, 8.8316f },
    { 4.5127f, 8.5235f },
    { 4.3423f, 8.2338f },
    { 4.1800f, 7.9608f },
    { 4.0247f, 7.7027f },
    { 3.8756f, 7.4582f },
    { 3.7319f, 7.2259f },
    { 3.5927f, 7.0046f }
};

/* The value at a temperature (degC) and an absolute station pressure (hPa); *mg_per_l is left as it was
 * unless PROBECAL_TABLE_OK is answered. */
static inline int oxygen_fresh_lookup(float celsius, float hectopascal, float *mg_per_l)
{
    float down, along, part, above, below;
    int row, column;

    if (celsius != celsius) { return PROBECAL_TABLE_TEMPERATURE_IS_NAN; }
    if (hectopascal != hectopascal) { return PROBECAL_TABLE_PRESSURE_IS_NAN; }
    if (celsius < OXYGEN_FRESH_FIRST_CELSIUS) { return PROBECAL_TABLE_TEMPERATURE_BELOW; }
    if (OXYGEN_FRESH_LAST_CELSIUS < celsius) { return PROBECAL_TABLE_TEMPERATURE_ABOVE; }
    if (hectopascal < OXYGEN_FRESH_FIRST_HECTOPASCAL) { return PROBECAL_TABLE_PRESSURE_BELOW; }
    if (OXYGEN_FRESH_LAST_HECTOPASCAL < hectopascal) { return PROBECAL_TABLE_PRESSURE_ABOVE; }
    down = (celsius - OXYGEN_FRESH_FIRST_CELSIUS) * OXYGEN_FRESH_ROWS_PER_KELVIN;
    along = (hectopascal - OXYGEN_FRESH_FIRST_HECTOPASCAL) * OXYGEN_FRESH_COLUMNS_PER_HECTOPASCAL;
    row = down < OXYGEN_FRESH_ROWS - 2 ? (int)down : OXYGEN_FRESH_ROWS - 2;
    column = along < OXYGEN_FRESH_COLUMNS - 2 ? (int)along : OXYGEN_FRESH_COLUMNS - 2;
    part = along - (float)column;
    above = oxygen_fresh_values[row][column];
    above = above + (oxygen_fresh_values[row][column + 1] - above) * part;
    below = oxygen_fresh_values[row + 1][column];
    below = below + (oxygen_fresh_values[row + 1][column + 1] - below) * part;
    *mg_per_l = above + (below - above) * (down - (float)row);
    return PROBECAL_TABLE_OK;
}

#endif /* PROBECAL_TABLE_OXYGEN_FRESH_H */
