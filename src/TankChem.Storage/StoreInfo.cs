namespace TankChem.Storage;

/// <summary>What a store holds and the room it has.</summary>
/// <param name="FileBytes">Bytes of the file and its write-ahead log.</param>
/// <param name="FreeDiskBytes">Bytes free for this user on its disk.</param>
/// <param name="Series">How many series of readings.</param>
/// <param name="UsableReadings">How many readings count in trends.</param>
/// <param name="StateValues">How many values of water states are kept.</param>
/// <param name="Corrections">How many earlier values corrected readings had.</param>
public sealed record StoreInfo(long FileBytes, long FreeDiskBytes, long Series, long UsableReadings, long StateValues, long Corrections);
