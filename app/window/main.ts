import 'plotly.js/dist/plotly.css';
import './styles/base.css';
import './styles/parts.css';
import { mount } from 'svelte';
import App from './App.svelte';
import { connectEngine } from './link/connect';
import { BenchState } from './state/bench.svelte';

const bench = new BenchState(connectEngine());
mount(App, { target: document.getElementById('window')!, props: { bench } });
