package finding

// LevelRoom is by how much a level may pass its limit before the rules speak, ft or m: above the rounding of levels,
// far under what matters.
const LevelRoom = levelRoom
