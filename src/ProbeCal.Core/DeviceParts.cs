#if NANOFRAMEWORK_1_0
// On the device Core is two assemblies, because the offsets of one end at 64 KB; the second uses the checks and ranges of the first.
[assembly: System.Runtime.CompilerServices.InternalsVisibleTo("ProbeCal.Nano.Calibration")]
#endif
