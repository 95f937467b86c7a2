import type { FlagName } from '../../../wind/flags.ts';

/** A word of a flag_meanings list, the bit it has in that family's files, and what it says of a cell when it is set. */
export interface FlagWord {
  word: string;
  mask: number;
  flag: FlagName;
}

/** The families of flag words that were reviewed. */
export type FlagFamily = 'c-band' | 'ku-band';

/**
 * The words of the C-band fan-beam family: the netCDF twin of BUFR flag table 0 21 155 (WMO-No. 306, FM 94), and bit 6
 * of it for a fit too far from the model function. Set means what the word says. The word of mask 131072 begins with
 * the producer's own name.
 */
export const cBandFlagWords: readonly FlagWord[] = [
  { word: 'distance_to_gmf_too_large', mask: 2 ** 6, flag: 'radarFitTooFar' },
  { word: 'data_are_redundant', mask: 2 ** 7, flag: 'redundant' },
  { word: 'no_meteorological_background_used', mask: 2 ** 8, flag: 'noBackgroundUsed' },
  { word: 'rain_detected', mask: 2 ** 9, flag: 'rain' },
  { word: 'rain_flag_not_usable', mask: 2 ** 10, flag: 'rainCheckNotUsable' },
  { word: 'small_wind_less_than_or_equal_to_3_m_s', mask: 2 ** 11, flag: 'atMost3Ms' },
  { word: 'large_wind_greater_than_30_m_s', mask: 2 ** 12, flag: 'above30Ms' },
  { word: 'wind_inversion_not_successful', mask: 2 ** 13, flag: 'noWindSolution' },
  { word: 'some_portion_of_wvc_is_over_ice', mask: 2 ** 14, flag: 'iceInCell' },
  { word: 'some_portion_of_wvc_is_over_land', mask: 2 ** 15, flag: 'landInCell' },
  { word: 'variational_quality_control_fails', mask: 2 ** 16, flag: 'fieldConsistencyFailed' },
  { word: 'producer_quality_control_fails', mask: 2 ** 17, flag: 'fitQualityFailed' },
  { word: 'product_monitoring_event_flag', mask: 2 ** 18, flag: 'monitoringAlarm' },
  { word: 'product_monitoring_not_used', mask: 2 ** 19, flag: 'monitoringNotRun' },
  { word: 'any_beam_noise_content_above_threshold', mask: 2 ** 20, flag: 'noisyLook' },
  { word: 'poor_azimuth_diversity', mask: 2 ** 21, flag: 'poorLookGeometry' },
  { word: 'not_enough_good_sigma0_for_wind_retrieval', mask: 2 ** 22, flag: 'tooFewLooks' },
];

/**
 * The words of the Ku-band pencil-beam family. Many read as good ('adequate', 'usable', 'available'), yet a set bit is
 * always the abnormal case: every bit starts set and is cleared when its test passes. Masks and sense: the writers'
 * own constants. Speed limits: those of BUFR flag table 0 21 109, which has the same names. That `available_data_flag`
 * speaks of kinds of look that are missing is from memory, no source.
 */
export const kuBandFlagWords: readonly FlagWord[] = [
  { word: 'adequate_sigma0_flag', mask: 1, flag: 'tooFewLooks' },
  { word: 'adequate_azimuth_diversity_flag', mask: 2, flag: 'poorLookGeometry' },
  { word: 'coastal_flag', mask: 128, flag: 'landInCell' },
  { word: 'ice_edge_flag', mask: 256, flag: 'iceInCell' },
  { word: 'wind_retrieval_flag', mask: 512, flag: 'noWindSolution' },
  { word: 'high_wind_speed_flag', mask: 1024, flag: 'above30Ms' },
  { word: 'low_wind_speed_flag', mask: 2048, flag: 'atMost3Ms' },
  { word: 'rain_impact_flag_usable', mask: 4096, flag: 'rainCheckNotUsable' },
  { word: 'rain_impact_flag', mask: 8192, flag: 'rain' },
  { word: 'available_data_flag', mask: 16384, flag: 'poorLookGeometry' },
];

/** What a word of a file's list means when set, and its family; undefined for a word that was never reviewed. */
export function reviewFlagWord(word: string): { flag: FlagName; family: FlagFamily } | undefined {
  const cBand = cBandFlagWords.find((known) => known.word === word);
  if (cBand) return { flag: cBand.flag, family: 'c-band' };
  if (word.endsWith('_quality_control_fails')) return { flag: 'fitQualityFailed', family: 'c-band' };
  const kuBand = kuBandFlagWords.find((known) => known.word === word);
  return kuBand && { flag: kuBand.flag, family: 'ku-band' };
}
