import { useQueryClient } from '@tanstack/react-query';
import { useRef, useState, type ChangeEvent } from 'react';
import { Link, useNavigate } from 'react-router';

import { may } from '#shared/access/matrix.ts';
import { exportDesign } from '#shared/api/design.ts';
import type { VesselSummary } from '#shared/api/vessels.ts';
import { useOpenDesign } from '#src/design/open-design.ts';
import { addressOf } from '#src/lib/call.ts';
import { changeReaderSettings, useReaderSettings, type ReaderSettings } from '#src/lib/reader-settings.ts';
import { signOut } from '#src/lib/session.ts';
import { Button } from '#src/ui/button.tsx';
import { Menu, MenuChoice, MenuLine, MenuLink, MenuRule } from '#src/ui/menu.tsx';

import { RenameVessel } from './rename-vessel.tsx';
import { ReplaceDrawing } from './replace-drawing.tsx';
import { useDuplicateVessel, useMoveVessel } from './vessels-api.ts';

const THEME_CHOICES = [
  { value: 'system', title: 'As the system' },
  { value: 'paper', title: 'Paper' },
  { value: 'dusk', title: 'Dusk' },
  { value: 'night', title: 'Night, red' },
] as const;
const UNIT_CHOICES = [
  { value: 'basis', title: 'As the basis' },
  { value: 'us', title: 'Feet and inches' },
  { value: 'metric', title: 'Metres' },
] as const;

/** What belongs to the vessel as a whole and to its reader. */
export function VesselMenu({ vessel, myName }: { readonly vessel: VesselSummary; readonly myName: string }) {
  const { vesselId, role } = vessel;
  const navigate = useNavigate();
  const client = useQueryClient();
  const duplicate = useDuplicateVessel(vesselId);
  const move = useMoveVessel();
  const fileInput = useRef<HTMLInputElement>(null);
  const [dialog, setDialog] = useState<'rename' | null>(null);
  const [file, setFile] = useState<{ name: string; text: string } | null>(null);
  const mayEdit = may(role, 'edit-design');
  const mayManage = may(role, 'manage-vessel');

  async function handleFile(event: ChangeEvent<HTMLInputElement>) {
    const chosen = event.currentTarget.files?.[0];
    event.currentTarget.value = '';
    if (chosen !== undefined) setFile({ name: chosen.name, text: await chosen.text() });
  }

  return (
    <>
      <Menu trigger={<Button aria-label={`Menu of ${vessel.name}`}>Menu</Button>}>
        {mayEdit && <UndoLines />}
        <MenuLink>
          <Link to={`/vessels/${vesselId}/basis`}>Basis and zones</Link>
        </MenuLink>
        {may(role, 'see-people') && (
          <MenuLink>
            <Link to={`/vessels/${vesselId}/people`}>People</Link>
          </MenuLink>
        )}
        <MenuLink>
          <Link to={`/vessels/${vesselId}/revisions`}>Issued revisions</Link>
        </MenuLink>
        <MenuRule />
        {may(role, 'see-design') && (
          <MenuLink>
            <a href={addressOf(exportDesign, { vesselId })} download>
              Save the drawing as a file
            </a>
          </MenuLink>
        )}
        {mayEdit && <MenuLine onChoose={() => fileInput.current?.click()}>Replace the drawing from a file</MenuLine>}
        {mayManage && (
          <>
            <MenuRule />
            <MenuLine onChoose={() => setDialog('rename')}>Rename</MenuLine>
            <MenuLine
              onChoose={() =>
                duplicate.mutate(undefined, { onSuccess: (copy) => void navigate(`/vessels/${copy.vesselId}/draw`) })
              }
            >
              Duplicate
            </MenuLine>
            <MenuLine
              onChoose={() =>
                move.mutate(
                  { vesselId, move: vessel.state === 'archived' ? 'unarchive' : 'archive' },
                  {
                    onSuccess: (moved) => void navigate(moved.state === 'archived' ? '/?state=archived' : '/'),
                  },
                )
              }
            >
              {vessel.state === 'archived' ? 'Bring back from the archive' : 'Archive'}
            </MenuLine>
            <MenuLine
              onChoose={() =>
                move.mutate({ vesselId, move: 'delete' }, { onSuccess: () => void navigate('/?state=deleted') })
              }
            >
              Delete, 30 days to bring it back
            </MenuLine>
          </>
        )}
        <MenuRule />
        <ReaderChoices />
        <MenuRule />
        <MenuLine onChoose={() => void signOut(client).then(() => navigate('/sign-in'))}>Sign out {myName}</MenuLine>
      </Menu>
      <input
        ref={fileInput}
        type="file"
        accept=".json,application/json"
        hidden
        aria-label="A drawing file"
        onChange={(event) => void handleFile(event)}
      />
      <RenameVessel vessel={vessel} open={dialog === 'rename'} onClose={() => setDialog(null)} />
      {file !== null && <ReplaceDrawing file={file} onClose={() => setFile(null)} />}
    </>
  );
}

/** What undo would take back, by name: for whoever has no keyboard at hand, or wants to know first. */
function UndoLines() {
  const canUndo = useOpenDesign((open) => open.canUndo);
  const canRedo = useOpenDesign((open) => open.canRedo);
  const undo = useOpenDesign((open) => open.undo);
  const redo = useOpenDesign((open) => open.redo);
  return (
    <>
      <MenuLine kbd="Ctrl Z" off={canUndo === null} onChoose={undo}>
        <span className="menu-what">Undo{canUndo !== null && `: ${canUndo}`}</span>
      </MenuLine>
      <MenuLine kbd="Ctrl Y" off={canRedo === null} onChoose={redo}>
        <span className="menu-what">Redo{canRedo !== null && `: ${canRedo}`}</span>
      </MenuLine>
      <MenuRule />
    </>
  );
}

/** Theme and units: of the reader, on this device. */
export function ReaderChoices() {
  const settings = useReaderSettings();
  return (
    <>
      <MenuChoice
        title="Theme"
        value={settings.theme}
        choices={THEME_CHOICES}
        onChoose={(theme) => changeReaderSettings({ theme: theme as ReaderSettings['theme'] })}
      />
      <MenuChoice
        title="Lengths on screen"
        value={settings.units}
        choices={UNIT_CHOICES}
        onChoose={(units) => changeReaderSettings({ units: units as ReaderSettings['units'] })}
      />
    </>
  );
}
