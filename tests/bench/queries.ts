/** Ten comparisons as somebody who knows SQL would type them: the soil-moisture stage, limits only. */
export const COUNT10 = `select count(*) from part where tier = 'approved' and withdrawn_at is null
 and supply_voltage_min <= 3.0 and supply_voltage_max >= 4.2 and supply_absolute_maximum_max >= 4.5 and slew_rate_min >= 17000
 and gain_bandwidth_typ >= 112000 and offset_voltage_max <= 0.004 and quiescent_current_max <= 90e-6 and temperature_min <= -20
 and temperature_max >= 60 and input_low_headroom_max <= 0.02`;

const MET = [
  'supply_voltage_min <= 3.0', 'supply_voltage_max >= 4.2', 'supply_absolute_maximum_max >= 4.5', 'input_low_headroom_max <= 0.02', 'input_high_headroom_max <= 2.6',
  'coalesce(slew_rate_min, slew_rate_typ * 0.6) >= 17000', 'coalesce(gain_bandwidth_min, gain_bandwidth_typ * 0.6) >= 112000', 'minimum_stable_gain_max <= 8',
  '8 * (offset_voltage_max + coalesce(offset_drift_max, offset_drift_typ * 3) * 45 + 2.0 / common_mode_rejection_min + 1.2 / supply_rejection_min + 1.3 / open_loop_gain_min) <= 0.035',
  'coalesce(quiescent_current_max, quiescent_current_typ * 1.4) <= 90e-6', 'temperature_min <= -20', 'temperature_max >= 60', 'channels >= 1', "status = 'approved'",
];

/**
 * As much of the job as somebody types: the tally of every comparison and the twenty cheapest that meet all. It is the easier job: no head-room
 * curves, no loop, no classes, one reading, no second opinion on what is missing. What it takes with all of that is in `whole-job.ts`.
 */
export const JOB = `select ${MET.map((condition) => `sum(not (${condition})), sum((${condition}) is null)`).join(', ')} from part where tier = 'approved' and withdrawn_at is null;
select id from part where tier = 'approved' and withdrawn_at is null and ${MET.map((condition) => `(${condition})`).join(' and ')} order by price_amount, quiescent_current_max, id limit 20`;
