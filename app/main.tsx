import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import './styles/tokens.css';
import './styles/base.css';
import { App } from './shell/App';
import { Opening } from './shell/Opening';
import { Unopened } from './shell/Unopened';
import { startApp } from './state/start';

const place = document.getElementById('root');
if (!place) throw new Error('index.html holds no element with the id "root".');
const root = createRoot(place);
// The browser may take its time with the storage: never an empty page meanwhile.
root.render(<Opening />);

startApp().then(
  () =>
    root.render(
      <StrictMode>
        <App />
      </StrictMode>,
    ),
  (error: unknown) => root.render(<Unopened reason={error instanceof Error ? error.message : String(error)} />),
);
