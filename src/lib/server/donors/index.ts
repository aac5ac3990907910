// Donors: dead engines taken in, what they died of, the release, what makes them safe, their boxes.
// Also the way from whole over the bench to stripped, and its gates.
// Not for the parts that come off them (parts), nor for what they cost and earn (ledger).
export { addBox } from './boxes';
export { editDonor, tickSafe } from './edit';
export { getDonor } from './get';
export { listDonors, listMakers, type DonorFilter, type DonorList } from './list';
export { finishDonor, parkDonor, reopenDonor, stripDonor } from './moves';
export { addDonorPhoto, addKeptPhoto, putBackDonorPhoto, removeDonorPhoto } from './photos';
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
export { takeIn, type TakenIn } from './take-in';
