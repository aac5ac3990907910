// Donors: dead engines taken in, what they died of, the release, what makes them safe, their boxes.
// Also the way from whole over the bench to stripped, and its gates.
// Not for the parts that come off them (parts), nor for what they cost and earn (ledger).
export { addBox } from './boxes';
export { editDonor, tickSafe } from './edit';
export { getDonor } from './get';
export { askReading } from './label-ask';
export { listReadings } from './label-readings';
export { takeLabel, undoTakeLabel } from './label-take';
export { listDonors, listMakers, type DonorFilter, type DonorList } from './list';
export { notToLeave } from './gates';
export { bringBackDonor, leaveDonor, reviewDonor } from './leave';
export { finishDonor, parkDonor, reopenDonor, stripDonor } from './moves';
export {
	addDonorPhoto,
	addKeptPhoto,
	changeShot,
	putBackDonorPhoto,
	removeDonorPhoto
} from './photos';
export { removedDonorPhotos } from './photos-away';
export { releaseDonor } from './release';
export {
	donorRow,
	findBox,
	newestRelease,
	pullableDonor,
	todayIn,
	type BoxRow,
	type DonorRow,
	type ReleaseRow
} from './rows';
export { undoDonorMove } from './undo-move';
export { takeIn, type TakenIn } from './take-in';
export { getTriage, saveTriage, undoTriage } from './triage';
