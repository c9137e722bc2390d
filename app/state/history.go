package state

// history is filled by undo and redo.
type history struct{}
