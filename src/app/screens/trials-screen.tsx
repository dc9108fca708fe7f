export { TrialsStation as Component } from '#src/features/trials/routes/trials-station.tsx';
