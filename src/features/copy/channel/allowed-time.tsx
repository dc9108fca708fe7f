import { useState } from 'react';
import type { Questions } from '#shared/contracts/copy-questions.ts';
import { Word } from '#src/components/word.tsx';
import { sayTime } from './say-time.ts';

interface AllowedTimeProps {
  readonly room: Questions;
  readonly onChange: (seconds: number) => void;
}

const CHOICES = [30, 60, 90, 120, 150, 180, 240, 300, 420, 600, 900] as const;

/** "1:45 of 2:00": what the questions take, of what is allowed; pressed, another time can be chosen. */
export function AllowedTime({ room, onChange }: AllowedTimeProps) {
  const [isChoosing, setIsChoosing] = useState(false);
  const taken = room.questions.reduce((sum, { seconds }) => sum + seconds, 0);
  const choices = [...new Set([...CHOICES, room.seconds])].toSorted((a, b) => a - b);
  return (
    <span className="whitespace-nowrap">
      {sayTime(taken)} of{' '}
      {isChoosing ? (
        <select
          ref={(select) => select?.focus()}
          aria-label="Time allowed for all questions"
          className="h-7 rounded-md border-[1.25px] border-edge bg-paper px-1"
          value={room.seconds}
          onBlur={() => setIsChoosing(false)}
          onChange={(event) => {
            onChange(Number(event.target.value));
            setIsChoosing(false);
          }}
        >
          {choices.map((seconds) => (
            <option key={seconds} value={seconds}>
              {sayTime(seconds)}
            </option>
          ))}
        </select>
      ) : (
        <Word
          className="min-h-6"
          aria-label={`${sayTime(room.seconds)} allowed; change`}
          onClick={() => setIsChoosing(true)}
        >
          {sayTime(room.seconds)}
        </Word>
      )}
    </span>
  );
}
