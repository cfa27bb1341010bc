export { type HoldsWork, leaveUnsaved } from '../../ui/confirm-dialog/leave-unsaved-guard';
