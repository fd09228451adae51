import { Switch } from '../../../ui/switch.tsx';
import { useDesk } from '../desk/use-desk.ts';

/** Which recording is heard, where a pattern has several. */
export function RecordingPicker() {
  const { pattern, recordingId, showRecording } = useDesk();
  if (pattern.recordings.length < 2 || recordingId === null) return null;
  return (
    <div className="overflow-x-auto border-b border-feint px-3.5 py-2">
      <Switch
        label="Recording"
        value={recordingId}
        options={pattern.recordings.map(({ id, title, number }) => ({ value: id, label: title || `Part ${number}` }))}
        onChange={showRecording}
      />
    </div>
  );
}
