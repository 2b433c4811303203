import { useRouter } from 'expo-router';
import { useState } from 'react';
import { v7 as uuidv7 } from 'uuid';
import { ApiError } from '../../client/api';
import { useCourses, useMakeSitting } from '../../client/sittings';
import type { CourseView } from '../../contracts/sittings';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { Select } from '../../ui/select';
import { Text } from '../../ui/text';
import { Vessel } from '../../ui/vessel';
import { QueryState } from '../query-state';
import { isDay } from './dates';
import { words } from './words';

interface NewSittingDialogProps {
  readonly onClose: () => void;
}

/** Begins a sitting of a course that the person leads, and goes to its paper. */
export function NewSittingDialog({ onClose }: NewSittingDialogProps) {
  const courses = useCourses();
  const led = (courses.data?.courses ?? []).filter(({ roles }) => roles.includes('lead'));
  if (courses.data && led.length > 0) return <Form courses={led} onClose={onClose} />;
  return (
    <Dialog title={words.title} onClose={onClose} actions={<Button onPress={onClose}>{words.cancel}</Button>}>
      <QueryState query={courses} fetching="Fetching your courses" failed="Your courses did not come.">
        {() => <Text>{words.noCourse}</Text>}
      </QueryState>
    </Dialog>
  );
}

function Form({ courses, onClose }: { courses: readonly CourseView[]; onClose: () => void }) {
  const router = useRouter();
  const make = useMakeSitting();
  const [once] = useState(() => uuidv7());
  const [courseId, setCourseId] = useState(courses[0]?.id ?? '');
  const [title, setTitle] = useState('');
  const [heldOn, setHeldOn] = useState('');
  const [secondPolicy, setSecondPolicy] = useState<'none' | 'all'>('none');
  const [wasTried, setTried] = useState(false);
  const fields = make.error instanceof ApiError ? make.error.fields : {};
  const titleError = wasTried && title.trim() === '' ? words.needsTitle : fields.title;
  const dateError = wasTried && !isDay(heldOn.trim()) ? words.needsDate : fields.heldOn;

  const go = () => {
    setTried(true);
    if (title.trim() === '' || !isDay(heldOn.trim())) return;
    make.mutate(
      { courseId, once, body: { title: title.trim(), heldOn: heldOn.trim(), secondPolicy } },
      {
        onSuccess: ({ id }) => {
          onClose();
          router.push(`/sittings/${id}/paper`);
        },
      },
    );
  };

  return (
    <Dialog
      title={words.title}
      onClose={onClose}
      testID="new-sitting"
      actions={
        <>
          <Button kind="primary" isBusy={make.isPending} onPress={go} testID="make-sitting">
            {words.make}
          </Button>
          <Button onPress={onClose}>{words.cancel}</Button>
        </>
      }
    >
      <Select label={words.course} value={courseId} options={courses.map(({ id, code, title: name }) => ({ value: id, label: `${code}, ${name}` }))} onChange={setCourseId} />
      <Vessel label={words.paperTitle} value={title} onChange={setTitle} help={words.titleHelp} error={titleError} maxLength={120} isFocusedFirst onSubmit={go} testID="sitting-title" />
      <Vessel label={words.heldOn} value={heldOn} onChange={setHeldOn} help={words.heldOnHelp} error={dateError} maxLength={10} variant="reading" onSubmit={go} testID="sitting-date" />
      <Select
        label={words.second}
        value={secondPolicy}
        options={[
          { value: 'none', label: words.seconds.none },
          { value: 'all', label: words.seconds.all },
        ]}
        onChange={setSecondPolicy}
      />
      {make.error && Object.keys(fields).length === 0 ? (
        <Text tone="methyl" live="assertive">
          {make.error.message}
        </Text>
      ) : null}
    </Dialog>
  );
}
